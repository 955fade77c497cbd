import { fixed } from "../../../lib/format";
import { useThemeColours } from "../../../lib/theme";
import { symbolPath } from "../../../map/paintTrials";
import type { ColourScale, MarkSymbol } from "../../../map/trialMarks";

/** The colour scale with its ends, and a marker a stage. */
export function Legend({
  scale,
  unit,
  markers,
  open,
  cooled,
}: {
  scale: ColourScale;
  unit: string;
  markers: ReadonlyMap<string, MarkSymbol>;
  /** some marks are drawn open */
  open: boolean;
  cooled: boolean;
}) {
  const { result, ink } = useThemeColours();
  return (
    <div className="space-y-1 py-1 text-sm">
      <div className="flex items-center gap-2 font-mono text-xs">
        <span>{fixed(scale.lo, 0)}</span>
        <span
          aria-hidden
          className="h-3 flex-1 border border-ink"
          style={{ background: `linear-gradient(to right, ${result.join(", ")})` }}
        />
        <span>
          {fixed(scale.hi, 0)} {unit}
        </span>
      </div>
      <p className="flex flex-wrap gap-x-3 text-muted">
        {[...markers].map(([code, symbol]) => (
          <span key={code} className="whitespace-nowrap">
            <svg viewBox="-8 -8 16 16" className="mr-1 inline-block h-3 w-3" aria-hidden>
              <path d={symbolPath(symbol)} fill="none" stroke={ink} strokeWidth={1.6} />
            </svg>
            <span className="font-mono">{code}</span>
          </span>
        ))}
        {open && <span>open: other conditions</span>}
        {cooled && <span>dotted: pH of a cooled sample</span>}
      </p>
    </div>
  );
}
