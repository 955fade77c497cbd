import { useDeferredValue, useMemo } from "react";
import { liquorCouples, type LiquorCouple } from "../../../../shared/reach/liquorCouples";
import type { Problem } from "../../../../shared/schemas/problem";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { Term } from "../../../components/Help";
import { MethodLink, SpeciesLink } from "../../../components/SourceLink";
import { Note } from "../../../components/text";
import { fixed, significant, withUnit } from "../../../lib/format";
import type { PotentialScale } from "../../../lib/potential";

/** Below this in either form a couple sets no potential on platinum. */
const SETS_EH_MG_PER_L = 10;

/** What the liquor's own couples hold at this pH, from one part in a hundred oxidised to one part reduced. */
export function CouplesBlock({
  problem,
  data,
  pH,
  scale,
}: {
  problem: Problem;
  data: ChemicalData;
  pH: number;
  scale: PotentialScale;
}) {
  const at = useDeferredValue(Number(pH.toFixed(2)));
  const couples = useMemo(() => {
    const outcome = liquorCouples(problem, data, at);
    return outcome.ok ? outcome.value : [];
  }, [problem, data, at]);
  if (couples.length === 0)
    return <Note className="py-1">The liquor has no couple of its own that could hold a potential.</Note>;
  const range = ([lo, hi]: readonly [number, number]) =>
    `${fixed(scale.toShown(lo), scale.digits)} … ${scale.format(hi)}`;
  return (
    <>
      <p className="pt-2 text-sm text-muted">
        <Term word="couples">The liquor’s own couples</Term> at pH {fixed(at, 2)}, from{" "}
        <span className="whitespace-nowrap">1 : 100</span> to <span className="whitespace-nowrap">100 : 1</span>
        {" · "}
        <MethodLink to="reach" />
      </p>
      <ul>
        {couples.map((couple) => (
          <li key={`${couple.reduced} ${couple.oxidised}`} className="hairline py-1">
            <div className="flex items-baseline justify-between gap-3">
              <span>
                <SpeciesLink id={couple.oxidised} /> / <SpeciesLink id={couple.reduced} />
              </span>
              <span className="font-mono whitespace-nowrap">{couple.held ? range(couple.held) : "sets no Eh"}</span>
            </div>
            <div className="text-sm text-muted">
              <Why couple={couple} scale={scale} />
            </div>
          </li>
        ))}
      </ul>
    </>
  );
}

function Why({
  couple: { held, range, shutBy, middle, scarcerMgPerL },
  scale,
}: {
  couple: LiquorCouple;
  scale: PotentialScale;
}) {
  const solids = [...new Map(shutBy.map((s) => [s.species, s])).values()];
  const cut = held === null || held[0] > range[0] + 1e-6 || held[1] < range[1] - 1e-6;
  return (
    <>
      {held === null ? "the two are never stable side by side" : `equal parts at ${scale.format(middle)}`}
      {cut && solids.length > 0 && (
        <>
          {held === null ? ": there stands " : "; ended by "}
          {solids.map((s, i) => (
            <span key={s.species}>
              {i > 0 && ", "}
              <SpeciesLink id={s.species} />
            </span>
          ))}
        </>
      )}
      {held !== null && scarcerMgPerL < SETS_EH_MG_PER_L && (
        <>
          ; the scarcer form falls to {withUnit(significant(scarcerMgPerL), "mg/L")} at the ends, where it no longer
          sets Eh
        </>
      )}
    </>
  );
}
