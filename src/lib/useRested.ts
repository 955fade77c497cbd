import { useEffect, useRef, useState } from "react";

/** A value that follows when the hand rests.
 *  @param rest  ms without a change that are taken for rest     @param most  ms it stays behind at most while the hand moves on */
export function useRested<Value>(value: Value, rest: number, most = rest): Value {
  const [shown, setShown] = useState(value);
  const latest = useRef(value);
  const timers = useRef({ rest: 0, most: 0 });
  useEffect(() => {
    latest.current = value;
    if (value === shown) return;
    const running = timers.current;
    const follow = () => {
      clearTimeout(running.rest);
      clearTimeout(running.most);
      running.most = 0;
      setShown(() => latest.current);
    };
    clearTimeout(running.rest);
    running.rest = window.setTimeout(follow, rest);
    if (running.most === 0) running.most = window.setTimeout(follow, most);
  }, [value, shown, rest, most]);
  useEffect(() => {
    const running = timers.current;
    return () => {
      clearTimeout(running.rest);
      clearTimeout(running.most);
      running.most = 0;
    };
  }, []);
  return shown;
}
