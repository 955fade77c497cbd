import { useVirtualizer } from "@tanstack/react-virtual";
import { useEffect, useState } from "react";
import type { TableBodyProps } from "./tableBody";

/** Only the rows in sight are in the page; two empty rows keep the place of the others. */
export function VirtualBody({ count, row, rowHeight, headHeight, box, startAt, reveal }: TableBodyProps) {
  // The box is attached after its rows are: only the second drawing finds it.
  const [, attached] = useState(false);
  useEffect(() => attached(true), []);
  // eslint-disable-next-line react-hooks/incompatible-library
  const virtualizer = useVirtualizer({
    count,
    getScrollElement: () => box.current,
    estimateSize: () => rowHeight,
    overscan: 12,
    scrollPaddingStart: headHeight + 4,
    // An address may name a row far down: it stands a few rows under the headings when the table opens.
    initialOffset: Math.max(0, startAt - 5) * rowHeight,
  });
  const items = virtualizer.getVirtualItems();
  const first = items[0]?.index ?? 0;
  const last = items.at(-1)?.index ?? -1;

  useEffect(() => {
    reveal.current = (index) => virtualizer.scrollToIndex(index);
  }, [reveal, virtualizer]);

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
    <td style={{ height, padding: 0 }} />
  </tr>
);
