import { useLayoutEffect, useState, type RefObject } from "react";

/** Width and height of an element in whole px, following it. */
export function useSize(ref: RefObject<HTMLElement | null>): { width: number; height: number } | null {
  const [size, setSize] = useState<{ width: number; height: number } | null>(null);
  useLayoutEffect(() => {
    const element = ref.current;
    if (!element) return;
    const read = () => {
      const next = { width: Math.floor(element.clientWidth), height: Math.floor(element.clientHeight) };
      setSize((old) => (old && old.width === next.width && old.height === next.height ? old : next));
    };
    read();
    const observer = new ResizeObserver(read);
    observer.observe(element);
    return () => observer.disconnect();
  }, [ref]);
  return size;
}
