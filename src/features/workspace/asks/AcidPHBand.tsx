import { useMemo, useState } from "react";
import { acidBand } from "../../../../shared/activity/freeAcid";
import { freeAcidOf } from "../../../../shared/plan/freeAcidOf";
import { Button } from "../../../components/Button";
import { Segmented } from "../../../components/choice";
import { FormulaText } from "../../../components/FormulaText";
import { Term } from "../../../components/Help";
import { NumberField } from "../../../components/NumberField";
import { MethodLink } from "../../../components/SourceLink";
import { Note, Remark } from "../../../components/text";
import { fixed, MINUS, withUnit } from "../../../lib/format";
import { setAcidBand, setPHBand } from "../model/edit";
import { useAsking } from "./context";
import { PlainPHBand } from "./PHBand";

const two = (x: number) => Number(x.toPrecision(2));

/** The band of pH where free acid may stand for it.
 *  @param low  the set point stands where free acid is a measure of pH */
export default function AcidPHBand({ low }: { low: boolean }) {
  const { inputs, edit, data, setPoint, readOnly } = useAsking();
  const { controlBand, freeAcidBand } = inputs;
  const { ligands, temperatureC } = inputs;
  const curve = useMemo(() => freeAcidOf(data, { ligands, temperatureC }), [data, ligands, temperatureC]);
  const sulfate = ligands.find((l) => l.component === "S")?.activity ?? 0;
  const [refused, setRefused] = useState<string | null>(null);
  const convert = (gPerL: number, pH: number) => acidBand(data, gPerL, pH, sulfate, temperatureC);

  /** What a band of free acid is where the set point stands; kept with the pH it was converted at. */
  function take(gPerL: number) {
    if (setPoint === null) return;
    const atPH = Number(setPoint.pH.toFixed(3));
    const band = convert(gPerL, atPH);
    setRefused(band.ok ? null : band.error.message);
    if (band.ok) edit(setAcidBand({ gPerL, atPH }, band.value.counted));
  }
  function toAcid() {
    if (setPoint === null || curve === null) return;
    const here = curve.at(setPoint.pH).gPerL;
    const like = curve.at(setPoint.pH - controlBand.pH).gPerL - here;
    take(two(Math.min(like, here / 4)));
  }
  return (
    <>
      {!readOnly && (
        <Segmented
          className="my-1"
          label="What the band of pH is given in"
          value={freeAcidBand ? "acid" : "pH"}
          onChange={(kind) => (kind === "pH" ? edit(setPHBand(controlBand.pH)) : toAcid())}
          options={[
            { value: "pH", label: "pH" },
            { value: "acid", label: "free acid, g/L", disabled: !low && !freeAcidBand },
          ]}
        />
      )}
      {freeAcidBand ? (
        <AcidBand
          {...{ ...freeAcidBand, take, convert, refused }}
          pH={low && setPoint ? setPoint.pH : null}
          counted={controlBand.pH}
        />
      ) : (
        <PlainPHBand />
      )}
    </>
  );
}

/** The band as typed, what it is in pH on either side, and whether that still holds where the set point is now. */
function AcidBand({
  gPerL,
  atPH,
  pH,
  counted,
  take,
  convert,
  refused,
}: {
  gPerL: number;
  atPH: number;
  /** of the set point now; null where free acid is no measure of it */
  pH: number | null;
  counted: number;
  take: (gPerL: number) => void;
  convert: (gPerL: number, pH: number) => ReturnType<typeof acidBand>;
  refused: string | null;
}) {
  const { readOnly } = useAsking();
  const then = convert(gPerL, atPH);
  const now = pH === null ? null : convert(gPerL, pH);
  const strayed = now?.ok ? Math.abs(now.value.counted / counted - 1) > 0.02 : true;
  return (
    <>
      <NumberField
        label="Control band of free acid"
        labelText={<Term word="freeAcidBand">Free acid ±</Term>}
        unit="g/L"
        value={gPerL}
        above={0}
        max={500}
        step={0.5}
        width={6}
        readOnly={readOnly || pH === null}
        onCommit={take}
        error={refused}
      />
      <Note className="py-1">
        {then.ok && Math.abs(then.value.counted / counted - 1) < 0.02 ? (
          <>
            ±{withUnit(String(gPerL), "g/L")} is{" "}
            <span className="font-mono whitespace-nowrap">
              {MINUS}
              {fixed(then.value.low, 2)}/+{fixed(then.value.high, 2)}
            </span>{" "}
            pH at pH {fixed(atPH, 2)}; the wider side counts, pH ±{fixed(counted, 2)}.
          </>
        ) : (
          <>
            pH ±{fixed(counted, 2)} counts, converted at pH {fixed(atPH, 2)} when it was typed.
          </>
        )}{" "}
        <MethodLink to="freeAcid">Indicative</MethodLink>.
      </Note>
      {!readOnly && strayed && (
        <Remark className="mb-1">
          {pH === null ? (
            <>The set point now stands where free acid is no measure of pH: give the band in pH.</>
          ) : now?.ok ? (
            <>
              At the set point now, pH {fixed(pH, 2)}, it is pH ±{fixed(now.value.counted, 2)}.{" "}
              <Button kind="quiet" className="h-auto!" onClick={() => take(gPerL)}>
                convert there
              </Button>
            </>
          ) : (
            <FormulaText text={`At the set point now it cannot be converted: ${now?.error.message ?? ""}.`} />
          )}
        </Remark>
      )}
    </>
  );
}
