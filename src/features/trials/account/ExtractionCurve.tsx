import { middleOf } from "../../../../shared/entry/interval";
import type { CurvePoint } from "../../../../shared/metallurgy/account/curve";
import { PlainTable } from "../../../components/PlainTable";
import { fixed } from "../../../lib/format";
import { rangeText } from "./figures";

const W = 420;
const H = 170;
const PAD = { l: 40, r: 12, t: 8, b: 30 };

/** Extraction against time at the samples: points joined by a hairline, and the numbers under it. */
export function ExtractionCurve({ curve, metal }: { curve: readonly CurvePoint[]; metal: string }) {
  const points = curve.flatMap(({ hours, extraction }) => {
    const y = middleOf(extraction);
    return hours === null || y === null ? [] : [{ x: hours, y }];
  });
  const longest = Math.max(...points.map(({ x }) => x), 1e-9);
  const x = (h: number) => PAD.l + (h / longest) * (W - PAD.l - PAD.r);
  const y = (pct: number) => H - PAD.b - (Math.max(0, Math.min(100, pct)) / 100) * (H - PAD.t - PAD.b);
  const line = points.map((p) => `${x(p.x)},${y(p.y)}`).join(" ");
  return (
    <>
      {points.length > 1 && (
        <svg
          viewBox={`0 0 ${W} ${H}`}
          className="mt-2 w-full max-w-[460px] font-mono text-[11px]"
          role="img"
          aria-label={`Extraction of ${metal} against time; the numbers stand below`}
        >
          {[0, 25, 50, 75, 100].map((pct) => (
            <g key={pct}>
              <line x1={PAD.l} x2={W - PAD.r} y1={y(pct)} y2={y(pct)} className="stroke-rule" />
              <text x={PAD.l - 6} y={y(pct) + 4} textAnchor="end" className="fill-ink">
                {pct}
              </text>
            </g>
          ))}
          <polyline points={line} fill="none" className="stroke-copper" strokeWidth={1.4} />
          {points.map((p) => (
            <circle key={p.x} cx={x(p.x)} cy={y(p.y)} r={3.4} className="fill-copper" />
          ))}
          {points.map((p) => (
            <text key={p.x} x={x(p.x)} y={H - PAD.b + 15} textAnchor="middle" className="fill-ink">
              {Number(p.x.toPrecision(3))}
            </text>
          ))}
          <text x={W - PAD.r} y={H - 3} textAnchor="end" className="fill-muted">
            h
          </text>
        </svg>
      )}
      <PlainTable
        caption="Extraction by sample"
        rows={curve.map((point, i) => ({ ...point, i }))}
        rowKey={({ i }) => String(i)}
        columns={[
          { header: "sample", cell: ({ i }) => i + 1 },
          {
            header: "time",
            unit: "h",
            number: true,
            cell: ({ hours }) => (hours === null ? "not written" : fixed(hours, 2)),
          },
          { header: "extraction", unit: "%", number: true, cell: ({ extraction }) => rangeText(extraction, 2) },
        ]}
      />
    </>
  );
}
