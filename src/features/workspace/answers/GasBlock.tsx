import type { HazardRegion } from "../../../../shared/hazards/regions";
import { Caution } from "../../../components/Caution";
import { Formula } from "../../../components/Formula";
import { FormulaText } from "../../../components/FormulaText";
import { Help, Term } from "../../../components/Help";
import { Quantity } from "../../../components/Quantity";
import { MethodLink } from "../../../components/SourceLink";
import { Note, SectionHead } from "../../../components/text";
import { fixed, withUnit } from "../../../lib/format";
import type { Gases } from "../model/usePoint";

/** Below this no instrument and no nose finds anything; the digits would only frighten or impress. */
const NOTHING = 1e-12;

const reached = ({ atSetPoint, threshold }: HazardRegion): boolean =>
  atSetPoint !== null && atSetPoint >= threshold.bar;

/** A gas stands at its threshold at the set point: its caution then belongs beside it. */
export const reachedAtSetPoint = ({ map }: Gases): boolean => map.regions.some(reached);

/** Equilibrium pressures at the set point; where one reaches its threshold, or its region reaches the window, the caution with exposure
 *  values stands beside it. */
export function GasBlock({ gases: { map, reaching } }: { gases: Gases }) {
  if (map.regions.length === 0) return null;
  const speaking = map.regions.filter((r) => reached(r) || reaching.has(r.gas));
  const quiet = map.regions.filter((r) => !speaking.includes(r));
  return (
    <section aria-label="Gas over the liquor" className="mt-4" data-testid="gases">
      <SectionHead aside={<MethodLink to="hazards" />}>
        <Term word="gasPressure">Gas over the liquor</Term>
      </SectionHead>
      {map.saturationBar !== null && (
        <Note className="py-1">
          The vessel is closed: water alone stands at {withUnit(fixed(map.saturationBar, 2), "bar")} here. All pressures
          are absolute.
        </Note>
      )}
      <ul>
        {speaking.map((region) => (
          <li key={region.gas} className="py-1">
            <Pressure region={region} />
            <Caution defer={false}>
              <p>
                {reached(region) ? (
                  <b>At the set point it reaches {region.threshold.words}. </b>
                ) : (
                  <b>Part of the window reaches {region.threshold.words}. </b>
                )}
                <FormulaText text={region.caution} />
              </p>
              {region.limits && (
                <p className="mt-0.5 text-xs text-muted">
                  <FormulaText text={region.limits} />
                </p>
              )}
            </Caution>
          </li>
        ))}
        {quiet.map((region) => (
          <li key={region.gas} className="hairline py-1">
            <Pressure region={region} />
          </li>
        ))}
      </ul>
      {speaking.length > 0 && <p className="mt-1 text-xs text-muted">{map.deference}</p>}
    </section>
  );
}

function Pressure({ region }: { region: HazardRegion }) {
  const { gas, atSetPoint, threshold, of } = region;
  return (
    <div className="flex items-baseline justify-between gap-3">
      <Help title={gas} trigger={<Formula formula={gas} />}>
        <p>
          Pressure in equilibrium with the liquor at the set point
          {of && (
            <>
              , by its total of <Formula formula={of.component} />, activity <Quantity value={of.activity} />
            </>
          )}
          . Threshold of the map: {threshold.words}.
        </p>
        <p>
          <FormulaText text={region.caution} />
        </p>
        {region.limits && (
          <p className="text-muted">
            <FormulaText text={region.limits} />
          </p>
        )}
      </Help>
      <span className={reached(region) ? "font-bold text-signal" : undefined}>
        {atSetPoint === null ? (
          <span className="text-muted">no set point</span>
        ) : atSetPoint < NOTHING ? (
          <span className="text-muted">next to none</span>
        ) : (
          <Quantity value={atSetPoint} unit="bar" />
        )}
      </span>
    </div>
  );
}
