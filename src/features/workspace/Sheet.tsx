import type { CSSProperties, ReactNode } from "react";

/** The workspace's three parts. Wide: asks, map, answers side by side, each scrolling by itself. Tablet: the map first, asks and
 *  answers in two columns below it. Paper: map, then answers and asks.
 *  @param room  px the middle wants on a tablet */
export function Sheet({
  room,
  asks,
  map,
  answers,
}: {
  room: number;
  asks: ReactNode;
  map: ReactNode;
  answers: ReactNode;
}) {
  const height = { "--map": `${room}px` } as CSSProperties;
  return (
    <div
      style={height}
      className="grid min-h-0 flex-1 grid-cols-2 grid-rows-[minmax(var(--map),62dvh)_auto] max-lg:pointer-coarse:grid-rows-[minmax(calc(var(--map)+48px),68dvh)_auto] lg:h-full lg:grid-cols-[264px_minmax(0,1fr)_290px] lg:grid-rows-1 print:flex print:flex-col"
    >
      <div className="order-2 border-r border-rule pr-4 pl-5 pt-3 pb-8 lg:order-1 lg:min-h-0 lg:overflow-y-auto print:order-3 print:border-0 print:columns-2 print:[&_section]:break-inside-avoid">
        {asks}
      </div>
      <div className="order-1 col-span-2 flex min-h-0 flex-col border-b border-rule lg:order-2 lg:col-span-1 lg:border-b-0 print:order-1 print:h-[640px] print:w-[690px] print:flex-none">
        {map}
      </div>
      <div className="order-3 pr-5 pl-4 pt-3 pb-8 lg:min-h-0 lg:overflow-y-auto lg:border-l lg:border-rule print:order-2 print:border-0 print:columns-2 print:[&_li]:break-inside-avoid">
        {answers}
      </div>
    </div>
  );
}
