/** Hands bytes to the browser as a file. */
export function saveFile(name: string, content: Blob): void {
  const url = URL.createObjectURL(content);
  Object.assign(document.createElement("a"), { href: url, download: name }).click();
  // Some browsers read the address only after the click has been dealt with.
  setTimeout(() => URL.revokeObjectURL(url), 10_000);
}

export const saveJson = (name: string, value: unknown): void =>
  saveFile(name, new Blob([`${JSON.stringify(value, null, 2)}\n`], { type: "application/json" }));
