import { judgeReach, type Reach, type ReachVerdict } from "../../../../shared/reach/reach";
import type { Window } from "../../../../shared/solution";
import { Formula } from "../../../components/Formula";
import { FormulaText } from "../../../components/FormulaText";
import { Help, Term } from "../../../components/Help";
import { Note, SectionHead } from "../../../components/text";
import { fixed } from "../../../lib/format";
import type { PotentialScale } from "../../../lib/potential";
import { allowedEh } from "../model/limitWords";

const verdictWords: Readonly<Record<ReachVerdict, string>> = {
  holds: "holds the set point",
  inside: "enters the window, not the set point",
  short: "does not reach the window",
  beyond: "goes past the window",
  "equilibrium-only": "no practical range on record for this liquor",
  unknown: "no range and no couple on record",
};

/** What each reagent brings the slurry to, and whether that is inside the window. */
export function ReachBlock({
  reaches,
  window,
  scale,
  choose,
}: {
  reaches: readonly Reach[];
  window: Window | null;
  scale: PotentialScale;
  /** the control that picks reagents */
  choose: React.ReactNode;
}) {
  const allowed = window && allowedEh(window);
  return (
    <section aria-label="Reach" className="mt-4">
      <SectionHead aside={choose}>
        <Term word="reach">Reach</Term>
      </SectionHead>
      {reaches.length === 0 && <Note className="py-1">No reagent is chosen.</Note>}
      <ul>
        {reaches.map((reach) => {
          const verdict = window && allowed ? judgeReach(reach, allowed, window.setPoint.Eh).verdict : null;
          return (
            <li key={reach.reagent.id} className="hairline py-1">
              <div className="flex items-baseline justify-between gap-3">
                <Name reach={reach} scale={scale} />
                <span className="font-mono whitespace-nowrap">{range(reach, scale)}</span>
              </div>
              <div className="text-sm text-muted">
                {[
                  verdict && verdictWords[verdict],
                  reach.reached === null &&
                    reach.equilibrium !== null &&
                    `equilibrium ${scale.format(reach.equilibrium)}, from E0 only`,
                ]
                  .filter(Boolean)
                  .join("; ")}
              </div>
            </li>
          );
        })}
      </ul>
    </section>
  );
}

function range({ reached }: Reach, scale: PotentialScale): string {
  if (reached === null) return "";
  const [lo, hi] = reached;
  return hi === null
    ? `${scale.format(lo)} and more`
    : `${fixed(scale.toShown(lo), scale.digits)} … ${scale.format(hi)}`;
}

/** The reagent's name, which opens what is known about it and from where. */
function Name({ reach: { reagent, equilibrium }, scale }: { reach: Reach; scale: PotentialScale }) {
  const { couple } = reagent;
  return (
    <Help title={reagent.name} trigger={<Formula formula={reagent.name} />}>
      <p>
        {reagent.kind}: <FormulaText text={reagent.note} />.
      </p>
      {couple && (
        <p>
          Couple <Formula formula={couple.oxidised} />/<Formula formula={couple.reduced} />, E0 {fixed(couple.E0, 3)} V
          vs SHE.
          {equilibrium !== null && (
            <> With every activity one it would stand at {scale.format(equilibrium)} here; E0 is that of 25 °C.</>
          )}
        </p>
      )}
      <p className="text-muted">{reagent.source}</p>
    </Help>
  );
}
