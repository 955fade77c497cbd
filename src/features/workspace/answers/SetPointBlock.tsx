import { fromSHE } from "../../../../shared/electrodes/convert";
import { electrodeSeries } from "../../../../shared/electrodes/series";
import type { Problem } from "../../../../shared/schemas/problem";
import type { Window } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { marginWords } from "../../../../shared/windows/limitWords";
import { SpeciesName } from "../../../components/Formula";
import { Term } from "../../../components/Help";
import { MethodLink } from "../../../components/SourceLink";
import { Note, Remark, Row, SectionHead } from "../../../components/text";
import { celsius, fixed, withUnit } from "../../../lib/format";
import type { PotentialScale } from "../../../lib/potential";
import { useScaleChoice } from "../../../lib/scaleChoice";
import { bandWords, marginSides, pHWords } from "../model/distances";

/** Where to run, in figures one can read across the room, and how sure the loop can be of staying there. */
export function SetPointBlock({
  window,
  band,
  data,
  scale,
  name,
}: {
  window: Window;
  band: Problem["controlBand"];
  data: ChemicalData;
  scale: PotentialScale;
  name: string;
}) {
  const at = window.setPoint;
  const ends = at.EhRange;
  return (
    <section aria-label="Set point">
      <SectionHead
        aside={
          <>
            {name} · <MethodLink to="setPoint" />
          </>
        }
      >
        <Term word="setPoint">Set point</Term>
      </SectionHead>
      <p className="pt-1 font-mono text-xl font-bold" data-testid="set-point">
        <span className="whitespace-nowrap">pH {fixed(at.pH, 2)}</span>
        <span className="ml-5 whitespace-nowrap">{scale.format(at.Eh)}</span>
      </p>
      <Note>
        vs {scale.electrode}. <ProbeReading Eh={at.Eh} data={data} scale={scale} /> {scale.remark}
      </Note>
      <Row
        className="mt-1"
        label={<Term word="margin">Margin</Term>}
        below={
          <>
            {marginSides(at, band)}; the loop strays ±{at.mixedPotential ? pHWords(band.pH) : bandWords(1, band)}.
            {at.cutByFrame && " Cut by the frame: the window may be wider than the map."}
          </>
        }
      >
        <b>
          {fixed(at.margin, 1)} {marginWords(at)}
        </b>
      </Row>
      {!window.controllable && (
        <Remark className="mt-1">
          Narrower than the control bands: this window is not a usable target with this loop.
        </Remark>
      )}
      {at.mixedPotential ? (
        <Note className="py-1">
          No couple of this liquor holds both forms above about 10&#8239;mg/L, so Eh is a{" "}
          <Term word="mixedPotential">mixed potential</Term>: a trend, and the margin counts pH alone (
          <MethodLink to="mixedPotential">why</MethodLink>).
          {ends && (
            <>
              {" "}
              At this pH anything from{" "}
              <span className="font-mono whitespace-nowrap">
                {fixed(scale.toShown(ends[0]), scale.digits)} to {scale.format(ends[1])}
              </span>{" "}
              is inside.
            </>
          )}
        </Note>
      ) : (
        at.couple && (
          <Note className="py-1">
            Eh is set by <SpeciesName id={at.couple[1]} /> over <SpeciesName id={at.couple[0]} />.
          </Note>
        )
      )}
    </section>
  );
}

/** The electrode a reading is quoted for where the screen itself is on SHE: the common 3 M Ag/AgCl, else the first. */
function usualProbe(data: ChemicalData) {
  const all = electrodeSeries(data.tables);
  return all.find((s) => s.id === "AGCL-3M") ?? all[0];
}

/** On SHE: what a common probe would show. On an electrode's own scale: what that is on SHE. */
function ProbeReading({ Eh, data, scale }: { Eh: number; data: ChemicalData; scale: PotentialScale }) {
  const [{ electrodeTemperatureC }] = useScaleChoice();
  if (scale.short !== "SHE") return <>That is {withUnit(fixed(Eh, 2), "V")} vs SHE.</>;
  const probe = usualProbe(data);
  if (!probe) return null;
  const tC = electrodeTemperatureC ?? 25;
  const reading = fromSHE(Eh, probe, tC);
  if (!reading.ok) return null;
  return (
    <>
      A probe of {probe.label} kept at {celsius(tC)} reads{" "}
      <span className="font-mono whitespace-nowrap">{withUnit(fixed(reading.value * 1000, 0), "mV")}</span>.
    </>
  );
}
