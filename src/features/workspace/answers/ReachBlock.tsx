import type { ReactNode } from "react";
import { type Reach, standsAt } from "../../../../shared/reach/reach";
import { type ReachAnswer, reachOf } from "../../../../shared/reach/verdict";
import type { PresetName } from "../../../../shared/schemas/plan";
import type { Window } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { Formula } from "../../../components/Formula";
import { FormulaText } from "../../../components/FormulaText";
import { Help, Term } from "../../../components/Help";
import { later } from "../../../components/later";
import { MethodLink } from "../../../components/SourceLink";
import { Note, SectionHead } from "../../../components/text";
import { fixed } from "../../../lib/format";
import type { PotentialScale } from "../../../lib/potential";
import { mVWords } from "../model/distances";

const NO_RANGE = "no practical range on record for this liquor";

/** The verdict in words. */
function verdictText({ verdict, side, shortMV }: ReachAnswer): string {
  const off = mVWords((shortMV ?? 0) / 1000);
  switch (verdict) {
    case "reachable":
      return "reaches the set point";
    case "partly":
      return shortMV === 0 || side === null
        ? `serves the set point, but may go ${side === "below" ? "below" : "above"} the window`
        : `enters the window and stays ${off} ${side} the set point`;
    case "not reachable":
      return `stays ${off} ${side ?? "outside"} the window`;
    case "not on record":
      return NO_RANGE;
  }
}

interface ReachProps {
  reaches: readonly Reach[];
  window: Window | null;
  data: ChemicalData;
  liquor: { preset: PresetName; temperatureC: number };
  /** where the equilibria are read */
  pH: number;
  scale: PotentialScale;
}

/** What each reagent brings the slurry to, and whether that is inside the window.
 *  @param choose  the control that picks reagents: it follows at once, so that no tick of a quick hand is lost */
export function ReachBlock({ choose, ...reach }: ReachProps & { choose: ReactNode }) {
  return (
    <section aria-label="Reach" className="mt-4">
      <SectionHead aside={choose}>
        <Term word="reach">Reach</Term>
      </SectionHead>
      <Lines {...reach} />
    </section>
  );
}

const Lines = later(function Lines({ reaches, window, data, liquor, pH, scale }: ReachProps) {
  if (reaches.length === 0) return <Note className="py-1">No reagent is chosen.</Note>;
  return (
    <ul>
      {reaches.map((reach) => {
        const equilibrium = standsAt(reach, pH);
        return (
          <li key={reach.reagent.id} className="hairline py-1">
            <div className="flex items-baseline justify-between gap-3">
              <Name reach={reach} equilibrium={equilibrium} scale={scale} />
              <span className="font-mono whitespace-nowrap">{range(reach, scale)}</span>
            </div>
            <div className="text-sm">
              {window
                ? verdictText(reachOf(data, reach.reagent, window, liquor))
                : reach.practical === null && NO_RANGE}
            </div>
            {equilibrium !== null && <Equilibrium reach={reach} Eh={equilibrium} scale={scale} />}
            <div className="mt-0.5 border-l-2 border-signal pl-2 text-sm text-muted">
              <FormulaText text={reach.reagent.hazard} />
            </div>
          </li>
        );
      })}
    </ul>
  );
});

/** Where the couple would stand, second to what practice shows and said to be no reading. */
function Equilibrium({ reach: { reagent, line }, Eh, scale }: { reach: Reach; Eh: number; scale: PotentialScale }) {
  const { couple } = reagent;
  return (
    <div className="text-sm text-muted">
      equilibrium
      {couple && (
        <>
          {" of "}
          <Formula formula={couple.oxidised} />/<Formula formula={couple.reduced} />
        </>
      )}
      , every activity one: <span className="font-mono whitespace-nowrap">{scale.format(Eh)}</span>
      {line?.from === "handbook" && <> (E0 of 25 °C)</>}; a slurry seldom shows it
    </div>
  );
}

function range({ practical }: Reach, scale: PotentialScale): string {
  if (practical === null) return "";
  const [lo, hi] = practical;
  return hi === null
    ? `${scale.format(lo)} and more`
    : `${fixed(scale.toShown(lo), scale.digits)} … ${scale.format(hi)}`;
}

/** The reagent's name, which opens what is known about it and from where. */
function Name({
  reach: { reagent, line },
  equilibrium,
  scale,
}: {
  reach: Reach;
  equilibrium: number | null;
  scale: PotentialScale;
}) {
  const { couple } = reagent;
  return (
    <Help title={reagent.name} trigger={<Formula formula={reagent.name} />}>
      <p>
        {reagent.kind}: <FormulaText text={reagent.note} />. Beside its work: <FormulaText text={reagent.hazard} />.
      </p>
      {couple && equilibrium !== null && (
        <p>
          Thin line: <Formula formula={couple.oxidised} />/<Formula formula={couple.reduced} /> would stand at{" "}
          {scale.format(equilibrium)} here with every activity one,{" "}
          {line?.from === "library" ? "E0 at this temperature" : "E0 of 25 °C"}. A slurry seldom shows it.
        </p>
      )}
      <p className="text-muted">
        {reagent.source}. <MethodLink to="reach">How reach is judged</MethodLink>
      </p>
    </Help>
  );
}
