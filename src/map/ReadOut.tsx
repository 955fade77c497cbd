import { useMemo } from "react";
import { FREE_ACID_BELOW, type FreeAcidCurve } from "../../shared/activity/freeAcid";
import { speciesAt } from "../../shared/setpoint/crosscut";
import type { Point, Solution } from "../../shared/solution";
import { keptWords } from "../../shared/hazards/words";
import { keptAt } from "../../shared/windows/shutGround";
import { SpeciesName } from "../components/Formula";
import { AcidAmount } from "../components/AcidAmount";
import { FormulaText } from "../components/FormulaText";
import { MetalName } from "../components/MetalLine";
import { celsius, fixed } from "../lib/format";
import type { PotentialScale } from "../lib/potential";
import { type CursorStore, useCursor } from "./cursorStore";
import { cssMetalColour, hatchesOf, shuts } from "./metalStyle";
import { Swatch } from "./Swatch";
import { BEYOND, isBeyond, type Trust } from "./trust";
import type { MapMetal } from "./view";

/** Names every metal's species at the cursor, in one fixed place; without a cursor, at the point the crosscuts run through. */
export function ReadOut({
  store,
  solution,
  metals,
  all = metals,
  scale,
  rest,
  freeAcid,
  trust,
}: {
  store: CursorStore;
  solution: Solution;
  metals: readonly MapMetal[];
  /** the plan's metals where not all are named: a hatch goes by its place among all, and ground is shut by any */
  all?: readonly MapMetal[];
  scale: PotentialScale;
  /** what is read while nobody points at the map */
  rest: { at: Point; words: string } | null;
  /** of a sulfate liquor */
  freeAcid?: FreeAcidCurve | null;
  /** how each species' energy reaches the temperature; those beyond what is trusted are marked */
  trust?: Trust | undefined;
}) {
  const cursor = useCursor(store);
  const hatches = useMemo(() => hatchesOf(all), [all]);
  const at = cursor ?? rest?.at ?? null;
  const here = at ? new Map(speciesAt(solution, at[0], at[1]).map((s) => [s.metal, s])) : null;
  const kept = at ? keptAt(solution, at) : [];
  const beyond = useMemo(() => [...(trust?.keys() ?? [])].some((id) => isBeyond(trust, id)), [trust]);
  const shut = here && (kept.length > 0 || all.some((m) => here.get(m.element)?.fulfilled === false));
  return (
    <div
      role="status"
      aria-label="Read-out"
      aria-live={cursor ? "off" : "polite"}
      className="min-h-11 text-sm"
      data-testid="read-out"
    >
      {at ? (
        <>
          <span className="mr-4 font-mono whitespace-nowrap">
            pH {fixed(at[0], 2)}
            {freeAcid && at[0] < FREE_ACID_BELOW && <AcidHere curve={freeAcid} pH={at[0]} />}
            <span className="mx-2">{scale.format(at[1])}</span>
            <span className="text-muted">vs {scale.short}</span>
          </span>
          <span className="mr-4 text-muted">
            {cursor ? "under the cursor" : rest?.words}
            {shut !== null && <>: {shut ? "shut" : "open"}</>}
          </span>
          {beyond && (
            <span
              className="text-muted"
              title="The temperature is beyond what the model of this species is trusted for: Fields drawn lists model and range"
            >
              {BEYOND} extrapolated
            </span>
          )}
          {kept.length > 0 && (
            <span className="text-signal">
              <FormulaText text={kept.map(keptWords).join("; ")} />: not here
            </span>
          )}
          {/* Columns, so that what stands under the cursor changes no line, and the map below keeps its place. */}
          <span className="clear-both grid grid-cols-[repeat(auto-fit,minmax(7.5rem,1fr))] gap-x-3">
            {metals.map((metal) => {
              const found = here?.get(metal.element);
              return (
                <span key={metal.element} className="truncate" title={found?.species}>
                  {found && shuts(metal) && (
                    <Swatch
                      small
                      className="relative top-px mr-1 inline-block"
                      hatch={found.fulfilled ? null : (hatches.get(metal.element) ?? null)}
                      fill={found.fulfilled ? "var(--color-tint)" : "none"}
                      colour={cssMetalColour(metal)}
                      title={
                        found.fulfilled ? `${metal.element} is as required` : `${metal.element} is not as required`
                      }
                    />
                  )}
                  <MetalName {...metal} />{" "}
                  {found ? (
                    <span title={trustWords(found.species, trust)}>
                      <SpeciesName id={found.species} withPhase />
                      {isBeyond(trust, found.species) && <sup>{BEYOND}</sup>}
                    </span>
                  ) : (
                    <span className="text-muted">off the map</span>
                  )}
                </span>
              );
            })}
          </span>
        </>
      ) : (
        <span className="text-muted">
          Point at the map, or press an arrow key on it, to read every metal’s species.
        </span>
      )}
    </div>
  );
}

/** "Cp polynomial, trusted 0 to 250 °C", or the whole warning. */
function trustWords(species: string, trust: Trust | undefined): string | undefined {
  const found = trust?.get(species);
  return found && (found.warning ?? `${found.model}, trusted ${found.trusted[0]} to ${celsius(found.trusted[1])}`);
}

/** What pH 1 means in the words of the plant; nothing where the sulfate of the liquor could not balance so much. */
function AcidHere({ curve, pH }: { curve: FreeAcidCurve; pH: number }) {
  const { gPerL, withinSulfate } = curve.at(pH);
  if (!withinSulfate) return null;
  return (
    <span
      className="ml-2 text-muted"
      title="Free acid by pK2 of bisulfate and Davies: indicative, control on a titration"
    >
      <AcidAmount gPerL={gPerL} />
    </span>
  );
}
