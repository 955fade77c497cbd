import type { HazardGas } from "../../../../shared/hazards/pressures";
import { Check } from "../../../components/choice";
import { Formula } from "../../../components/Formula";
import { Help } from "../../../components/Help";
import { Note } from "../../../components/text";
import type { ShownRange } from "../../../map/traces/practice";
import { fixed } from "../../../lib/format";
import type { Gases } from "../model/usePoint";
import { Fold } from "./Fold";

/** Which gases the hazard layer draws, each with its threshold; those that reach the window are drawn unless somebody says no. */
export function GasLayers({
  gases: { map, shown, reaching },
  onChoose,
}: {
  gases: Gases;
  onChoose: (gas: HazardGas, on: boolean) => void;
}) {
  return (
    <Fold
      title={`Gases drawn: ${
        map.regions
          .filter((r) => shown.has(r.gas))
          .map((r) => r.gas)
          .join(", ") || "none"
      }`}
    >
      {map.regions.map(({ gas, threshold }) => (
        <Check
          key={gas}
          label={`Draw the region of ${gas}`}
          checked={shown.has(gas)}
          onChange={(on) => onChoose(gas, on)}
          hint={`${threshold.words}${reaching.has(gas) ? "; reaches the window" : ""}`}
        >
          <Formula formula={gas} />
        </Check>
      ))}
      {map.absent.length > 0 && (
        <Note>
          No pressure for{" "}
          {map.absent.map(({ gas, why }, i) => (
            <span key={gas}>
              {i > 0 && "; "}
              <Formula formula={gas} /> ({why})
            </span>
          ))}
          .
        </Note>
      )}
    </Fold>
  );
}

const span = (range: readonly [number, number] | null, digits: number): string =>
  range === null
    ? "not stated"
    : range[0] === range[1]
      ? fixed(range[0], digits)
      : `${fixed(range[0], digits)} to ${fixed(range[1], digits)}`;

/** The ranges that the map shows, with what was published and where. */
export function PracticeList({ ranges }: { ranges: readonly ShownRange[] }) {
  if (ranges.length === 0) return <Note className="pb-1">No published range is on record for these metals here.</Note>;
  return (
    <ul className="pb-1 text-sm" aria-label="Published ranges shown">
      {ranges.map(({ range, atTemperature }) => (
        <li key={range.id} className="hairline py-0.5">
          <span className="mr-2 font-mono">{range.id}</span>
          <Help title={`${range.id}, ${range.step}`} trigger={range.step}>
            <p>
              pH {span(range.pH, 1)}; Eh {range.Eh ? `${span(range.Eh, 2)} V vs SHE` : "not stated"};{" "}
              {range.temperatureC ? `${span(range.temperatureC, 0)} °C` : "temperature not stated"}
              {range.conditions && `; ${range.conditions}`}
              {range.recovery && `; recovery ${range.recovery} %`}.
            </p>
            {range.notEquilibrium && <p>Set by {range.notEquilibrium}, not by equilibrium.</p>}
            <p className="text-muted">
              {range.source}. {range.seen ? "" : "From memory: a sanity range, never a hard limit. "}
              {range.note}
            </p>
          </Help>
          {!atTemperature && <span className="text-muted"> at another temperature</span>}
        </li>
      ))}
    </ul>
  );
}
