import { useVirtualizer } from "@tanstack/react-virtual";
import { useEffect, useRef } from "react";
import type { TableBodyProps } from "./tableBody";

/** Only the rows in sight are in the page; two empty rows keep the place of the others. */
export function VirtualBody({ count, row, rowHeight, headHeight, box, startAt, reveal }: TableBodyProps) {
  // eslint-disable-next-line react-hooks/incompatible-library
  const virtualizer = useVirtualizer({
    count,
    getScrollElement: () => box.current,
    estimateSize: () => rowHeight,
    overscan: 12,
    scrollPaddingStart: headHeight + 4,
  });
  const items = virtualizer.getVirtualItems();
  const first = items[0]?.index ?? 0;
  const last = items.at(-1)?.index ?? -1;

  useEffect(() => {
    reveal.current = (index) => virtualizer.scrollToIndex(index);
  }, [reveal, virtualizer]);

  const arrived = useRef(false);
  useEffect(() => {
    if (arrived.current || startAt < 0) return;
    arrived.current = true;
    if (startAt > 10) virtualizer.scrollToIndex(startAt, { align: "center" });
  }, [startAt, virtualizer]);

  return (
    <>
      {first > 0 && <Gap height={first * rowHeight} />}
      {items.map(({ index }) => row(index))}
      {last + 1 < count && <Gap height={(count - last - 1) * rowHeight} />}
    </>
  );
}

const Gap = ({ height }: { height: number }) => (
  <tr aria-hidden>
    <td colSpan={99} style={{ height, padding: 0 }} />
  </tr>
);
