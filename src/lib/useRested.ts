import { useEffect, useRef, useState } from "react";

/** A value that follows with a pause: while the hand moves it is renewed so often and no oftener, and once after it rests.
 *  @param ms  the longest it stays behind */
export function useRested<Value>(value: Value, ms: number): Value {
  const [shown, setShown] = useState(value);
  const latest = useRef(value);
  const timer = useRef(0);
  useEffect(() => {
    latest.current = value;
    if (timer.current !== 0 || value === shown) return;
    timer.current = window.setTimeout(() => {
      timer.current = 0;
      setShown(() => latest.current);
    }, ms);
  }, [value, shown, ms]);
  useEffect(
    () => () => {
      clearTimeout(timer.current);
      timer.current = 0;
    },
    [],
  );
  return shown;
}
