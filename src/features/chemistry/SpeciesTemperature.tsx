import { useMemo, useState } from "react";
import { energiesAt } from "../../../shared/gibbs/energies";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { kelvin } from "../../../shared/units";
import { FormulaText } from "../../components/FormulaText";
import { Term } from "../../components/Help";
import { PlainTable } from "../../components/PlainTable";
import { Slider } from "../../components/Slider";
import { Note, Remark, Row, SectionHead } from "../../components/text";
import { celsius, fixed, THIN_SPACE } from "../../lib/format";

const stops = [0, 25, 60, 100, 150];

/** How the free energy of a species goes with temperature, at the T one asks for and at five fixed ones. */
export function SpeciesTemperature({ data, id }: { data: ChemicalData; id: string }) {
  const [t, setT] = useState(25);
  const at = useMemo(() => energiesAt(data, kelvin(t)).of(id), [data, id, t]);
  const rows = useMemo(
    () => stops.map((stop) => ({ stop, energy: energiesAt(data, kelvin(stop)).of(id) })),
    [data, id],
  );
  const held = data.tables.extrapolation.find((row) => row.id === id);
  const [lo, hi] = at.trusted;
  return (
    <>
      <SectionHead className="mt-4" aside="1 bar or saturated">
        Free energy at T
      </SectionHead>
      <Slider label="Temperature" value={t} onChange={setT} min={0} max={150} step={1} unit="°C" marks={stops} />
      <Row label={`G at ${celsius(t)}`}>
        <b className="text-lg">{fixed(at.G / 1000, 2)}</b>
        {THIN_SPACE}kJ/mol
      </Row>
      {at.warning !== null && (
        <Remark className="my-1">
          <FormulaText text={at.warning} />
        </Remark>
      )}
      <Row label={<Term word="temperatureModel">Temperature model</Term>}>
        <span className="font-sans text-sm">{at.model}</span>
      </Row>
      <Row label={<Term word="trustedRange">Trusted range</Term>}>
        {lo === hi ? celsius(lo) : `${fixed(lo, 0)} to ${celsius(hi)}`}
      </Row>
      {held && held.reaction !== "" && (
        <Row
          label={held.hold === "logK" ? "Held: log K of" : "Held: G of"}
          below={<FormulaText text={held.reaction} />}
        >
          {held.logK_25 === null ? "" : `log K ${fixed(held.logK_25, 2)}`}
        </Row>
      )}
      {held?.note && (
        <Note className="py-1">
          <FormulaText text={held.note} />
        </Note>
      )}
      <PlainTable
        caption="Free energy at five temperatures"
        className="mt-2"
        rows={rows}
        rowKey={({ stop }) => String(stop)}
        columns={[
          { header: "T", unit: "°C", number: true, width: "4em", cell: ({ stop }) => stop },
          { header: "G", unit: "kJ/mol", number: true, width: "8em", cell: ({ energy }) => fixed(energy.G / 1000, 2) },
          {
            header: "trusted",
            cell: ({ energy }) =>
              energy.warning === null ? "yes" : <span className="text-muted">no, outside the range</span>,
          },
        ]}
      />
      <Note className="pt-1">
        Apparent free energy: G of formation at 25 °C less the integral of the entropy; H<sup>+</sup> is zero at every
        T.
      </Note>
    </>
  );
}
