let pressed = false;
const note = (now: boolean) => () => {
  pressed = now;
};
window.addEventListener("pointerdown", note(true), true);
for (const end of ["pointerup", "pointercancel"]) window.addEventListener(end, note(false), true);

/** Does something once the finger is off the screen. What a field says as it is left would move the button that is just being pressed,
 *  and the press would miss it. */
export function afterPress(then: () => void): void {
  if (!pressed) then();
  else window.addEventListener("pointerup", () => setTimeout(then), { once: true, capture: true });
}
