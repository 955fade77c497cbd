import { useMemo } from "react";
import { useNavigate } from "react-router-dom";
import { fixed } from "../../lib/format";
import { percentAxis, type Dot, type FeedStrips, type Strip } from "./compareModel";

const LEFT = 150;
const RIGHT = 16;
const ROW = 50;
const HEAD = 30;
const FOOT = 40;
const R = 4.2;
const LANE = 4.6;
const MIDDLE = 18;

/** Dots that would lie on one another are moved up or down, in the order of their value. */
function spreadOut(dots: readonly Dot[], x: (value: number) => number): { dot: Dot; cx: number; dy: number }[] {
  const lanes = [0, -1, 1, -2, 2, -3, 3];
  const last = new Map<number, number>();
  return [...dots]
    .sort((a, b) => a.value - b.value)
    .map((dot) => {
      const cx = x(dot.value);
      const room = (l: number) => cx - (last.get(l) ?? -Infinity);
      const lane = lanes.find((l) => room(l) > 2 * R) ?? lanes.reduce((best, l) => (room(l) > room(best) ? l : best));
      last.set(lane, cx);
      return { dot, cx, dy: lane * LANE };
    });
}

/** Every trial as a dot, by feed and within a feed by campaign: filled inside the window, open outside, dashed where conditions
 *  are others; mean and range under them. */
export function DotStrips({
  feeds,
  axisName,
  width = 620,
}: {
  feeds: readonly FeedStrips[];
  axisName: string;
  width?: number;
}) {
  const navigate = useNavigate();
  const axis = useMemo(
    () => percentAxis(feeds.flatMap(({ strips }) => strips.flatMap(({ dots }) => dots.map(({ value }) => value)))),
    [feeds],
  );
  const x = (value: number) => LEFT + ((value - axis.lo) / (axis.hi - axis.lo)) * (width - LEFT - RIGHT);
  const tops = feeds.map((_, i) => feeds.slice(0, i).reduce((sum, f) => sum + HEAD + f.strips.length * ROW, 8));
  const bottom = 8 + feeds.reduce((sum, f) => sum + HEAD + f.strips.length * ROW, 0);
  return (
    <svg
      viewBox={`0 0 ${width} ${bottom + FOOT}`}
      className="w-full max-w-[720px] font-mono text-[12px]"
      role="group"
      aria-label={axisName}
    >
      {axis.ticks.map((tick) => (
        <g key={tick}>
          <line x1={x(tick)} x2={x(tick)} y1={4} y2={bottom} className="stroke-rule" />
          <text x={x(tick)} y={bottom + 16} textAnchor="middle" className="fill-ink">
            {tick}
          </text>
        </g>
      ))}
      <text x={width - RIGHT} y={bottom + 34} textAnchor="end" className="fill-muted">
        {axisName}
      </text>
      {feeds.map(({ feedId, feedName, strips }, i) => (
        <g key={feedId} transform={`translate(0 ${tops[i]})`}>
          <text x={0} y={15} strokeWidth={5} paintOrder="stroke" className="fill-ink stroke-paper font-bold">
            {feedName}
          </text>
          {strips.map((strip, k) => (
            <g key={strip.campaignId} transform={`translate(0 ${HEAD + k * ROW})`}>
              <StripRow strip={strip} x={x} onOpen={(id) => void navigate(`/trials/${id}`)} />
            </g>
          ))}
        </g>
      ))}
    </svg>
  );
}

function StripRow({ strip, x, onOpen }: { strip: Strip; x: (value: number) => number; onOpen: (id: string) => void }) {
  const { spread, temperatureC: t, campaignCode, dots } = strip;
  const warm = t && (t.max - t.min < 1 ? `${fixed(t.mean, 0)} °C` : `${fixed(t.min, 0)} to ${fixed(t.max, 0)} °C`);
  return (
    <>
      <text x={0} y={22} className="fill-ink">
        {campaignCode}
      </text>
      <text x={58} y={22} className="fill-muted font-sans text-[11px]">
        {dots.length === 0 ? "no trial" : `n ${dots.length}${warm ? `, ${warm}` : ""}`}
      </text>
      {spread && spread.n > 1 && (
        <g className="stroke-ink" strokeWidth={1.2}>
          <line x1={x(spread.min)} x2={x(spread.max)} y1={39} y2={39} />
          <line x1={x(spread.min)} x2={x(spread.min)} y1={36} y2={42} />
          <line x1={x(spread.max)} x2={x(spread.max)} y1={36} y2={42} />
          <line x1={x(spread.mean)} x2={x(spread.mean)} y1={35} y2={43} strokeWidth={3} />
        </g>
      )}
      {spreadOut(dots, x).map(({ dot, cx, dy }) => (
        <circle
          key={dot.id}
          cx={cx}
          cy={MIDDLE + dy}
          r={R}
          role="link"
          tabIndex={0}
          aria-label={`Trial ${dot.code}, ${fixed(dot.value, 1)} %, ${dot.count}`}
          onClick={() => onOpen(dot.id)}
          onKeyDown={(event) => event.key === "Enter" && onOpen(dot.id)}
          className={
            dot.count === "inside"
              ? "cursor-pointer fill-verdigris stroke-ink"
              : dot.count === "outside"
                ? "cursor-pointer fill-sheet stroke-ink"
                : "cursor-pointer fill-sheet stroke-muted"
          }
          strokeWidth={1.2}
          strokeDasharray={dot.count === "inside" || dot.count === "outside" ? undefined : "2 1.6"}
        >
          <title>{`${dot.code}: ${fixed(dot.value, 1)} %, ${dot.count === "apart" ? "other conditions" : dot.count}`}</title>
        </circle>
      ))}
    </>
  );
}
