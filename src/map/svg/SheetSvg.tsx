import type { ReactNode } from "react";
import type { Sheet } from "../boxes";

/** One layer of shapes over the whole sheet, with the map's own rectangle as a clip.
 *  @param clip  id of the clip     @param box  of the map on the sheet, px     @param defs  patterns */
export function SheetSvg({
  sheet,
  box,
  clip,
  defs,
  children,
  testId,
}: {
  sheet: Sheet;
  box: { x0: number; y0: number; x1: number; y1: number };
  clip: string;
  defs: ReactNode;
  children: ReactNode;
  testId: string;
}) {
  return (
    <svg
      xmlns="http://www.w3.org/2000/svg"
      className="pointer-events-none absolute top-0 left-0"
      width={sheet.width}
      height={sheet.height}
      aria-hidden
      data-testid={testId}
    >
      <defs>
        {defs}
        <clipPath id={clip}>
          <rect x={box.x0} y={box.y0} width={box.x1 - box.x0} height={box.y1 - box.y0} />
        </clipPath>
      </defs>
      {children}
    </svg>
  );
}
