import { Fragment, type ReactNode } from "react";
import { Link } from "react-router-dom";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { Formula } from "../../components/Formula";
import { FormulaText } from "../../components/FormulaText";
import { Term } from "../../components/Help";
import { Note, Row, SectionHead } from "../../components/text";
import { fixed, MINUS, withUnit } from "../../lib/format";
import { lixiviantName } from "../../lib/planWords";
import type { PresetName } from "../../../shared/schemas/plan";
import { SpeciesEdits } from "../speciesEdits/SpeciesEdits";
import { whenText } from "./leftOutWords";
import { phaseWord } from "./phases";
import { SpeciesTemperature } from "./SpeciesTemperature";

/** Everything the library knows of one species, in the order one doubts it: number, source, temperature, use. */
export function SpeciesDetail({ data, id }: { data: ChemicalData; id: string }) {
  const species = data.species.get(id);
  if (!species) return null;
  const { row } = species;
  const molar = molarMass(data, species.composition);
  return (
    <aside
      aria-label={`Species ${id}`}
      className="-mt-3 w-[300px] shrink-0 overflow-y-auto border-l border-rule pt-3 pr-1 pb-6 pl-5 lg:w-[372px]"
    >
      <h2 className="text-xl font-bold">
        <Formula formula={row.formula} />
      </h2>
      <p>
        {row.name}, {phaseWord[row.phase]}
      </p>
      <p className="font-mono text-xs text-muted">{id}</p>

      <SectionHead className="mt-4" aside="25 °C, 1 bar">
        Standard values
      </SectionHead>
      <Row label="G of formation">{value(row.dGf_kJ, "kJ/mol")}</Row>
      <Row label="H of formation">{value(row.dHf_kJ, "kJ/mol")}</Row>
      <Row label="Entropy">{value(row.S_J, "J/(mol K)")}</Row>
      <Row label="Heat capacity">{value(row.Cp_J, "J/(mol K)")}</Row>
      {row.Cp_a !== null && (
        <Row
          label="Cp polynomial"
          below={
            <span className="font-mono text-xs">
              {asGiven(row.Cp_a)} + {asGiven(row.Cp_b ?? 0)} T + {asGiven(row.Cp_c ?? 0)} T<sup>{MINUS}2</sup>, T in K
            </span>
          }
        >
          {row.Cp_Tmax_K === null ? "" : `to ${withUnit(fixed(row.Cp_Tmax_K, 0), "K")}`}
        </Row>
      )}
      <Row label="Molar mass">{molar === null ? "unknown" : withUnit(fixed(molar, 3), "g/mol")}</Row>
      <Row label="Made of">
        <Parts composition={species.composition} />
      </Row>

      <SectionHead className="mt-4" aside={<Term word="grade">grade {row.grade}</Term>}>
        Source
      </SectionHead>
      {sources(data, row.source).map(({ code, citation }) => (
        <p key={code} className="hairline py-1 text-sm">
          <span className="font-mono">{code}</span> {citation}
        </p>
      ))}
      {row.note !== "" && (
        <p className="py-1 text-sm text-muted">
          <FormulaText text={row.note} />
        </p>
      )}

      <SpeciesEdits data={data} id={id} />
      <SpeciesTemperature data={data} id={id} />
      <InPlans data={data} id={id} />
    </aside>
  );
}

/** as it stands in the table, digit for digit */
const asGiven = (x: number) => String(x).replace("-", MINUS);

const value = (x: number | null, unit: string): ReactNode =>
  x === null ? <span className="font-sans text-muted">not known</span> : withUnit(asGiven(x), unit);

/** Several codes may stand in one cell. */
function sources(data: ChemicalData, cell: string) {
  const codes = cell.split(/[;,/]\s*/).filter(Boolean);
  return data.tables.references.filter(({ code }) => codes.includes(code));
}

function molarMass(data: ChemicalData, composition: Readonly<Record<string, number>>): number | null {
  let sum = 0;
  for (const [component, n] of Object.entries(composition)) sum += n * (data.molarMass.get(component) ?? Number.NaN);
  return Number.isNaN(sum) ? null : sum;
}

const Parts = ({ composition }: { composition: Readonly<Record<string, number>> }) => (
  <span className="text-sm">
    {Object.entries(composition).map(([component, n], i) => (
      <Fragment key={component}>
        {i > 0 && ", "}
        {n !== 1 && `${n} `}
        <Formula formula={component} />
      </Fragment>
    ))}
  </span>
);

/** Where plans leave this species out unless they are told otherwise. */
function InPlans({ data, id }: { data: ChemicalData; id: string }) {
  const defaults = data.tables.defaults.filter((row) => row.id === id);
  const solids = data.tables.solidsBasis.filter((row) => row.id === id);
  const presets = data.tables.presets.filter((row) => row.exclude_ids.split(";").includes(id));
  const none = defaults.length + solids.length + presets.length === 0;
  return (
    <>
      <SectionHead className="mt-4" aside={<Link to="/chemistry?show=left-out">all that is left out</Link>}>
        In plans
      </SectionHead>
      {none && <Note className="py-1">Counts wherever its metal and ligands are in the plan.</Note>}
      {defaults.map((row) => (
        <Row key={row.when} label={`Left out ${whenText(row.when)}`} below={row.reason} />
      ))}
      {solids.map((row) => (
        <Row
          key={row.fresh}
          label={
            row.fresh === "in"
              ? "Counted on the fresh solids basis"
              : `Left out on the fresh solids basis${row.below_C === null ? "" : ` below ${withUnit(String(row.below_C), "°C")}`}`
          }
          below={row.reason}
        />
      ))}
      {presets.length > 0 && (
        <Row
          label="Left out by the lixiviant"
          below={presets.map(({ preset }) => lixiviantName[preset as PresetName] ?? preset).join(", ")}
        />
      )}
    </>
  );
}
