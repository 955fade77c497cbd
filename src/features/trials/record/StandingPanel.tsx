import { useDeferredValue, useMemo } from "react";
import { Link } from "react-router-dom";
import { Note, Remark, Row, SectionHead } from "../../../components/text";
import { classes } from "../../../lib/classes";
import { fixed, withUnit } from "../../../lib/format";
import { usePotentialScale } from "../../../lib/potential";
import { deviationWords, plannedOutside, plannedPoint } from "../model/deviationWords";
import { placeWords } from "../model/placeWords";
import { sectionOf } from "../model/trialWords";
import { standingOf } from "../model/workings";
import { AcidNote, trialAcidOf } from "./AcidNote";
import { useRecording } from "./context";

const toneClass = { good: "text-verdigris", bad: "text-ink font-bold", quiet: "text-muted" } as const;

/** Beside the record: what it says so far, where it stands on the map, and what it still needs. */
export function StandingPanel() {
  const { values, feed, stage, data, electrodes, solved, campaign } = useRecording();
  const scale = usePotentialScale();
  // Typing goes first; the figures follow.
  const record = useDeferredValue(values);
  const standing = useMemo(
    () => (feed && stage ? standingOf(record, feed, stage, data, electrodes, solved) : null),
    [record, feed, stage, data, electrodes, solved],
  );
  if (!standing || !stage)
    return (
      <Note className="pt-2">
        {stage ? "Reading the feed …" : `Campaign ${campaign.code} has no stage ${values.stage}: no figures.`}
      </Note>
    );
  const { figures, missing, point, pointMissing, judgement, comparability } = standing;
  const pct = (x: number | null, digits = 1) =>
    x === null ? <span className="font-sans text-muted">open</span> : withUnit(fixed(x, digits), "%");
  const acid = trialAcidOf(record, point, data, solved?.inputs);
  const wanted = plannedPoint(values.planned, electrodes);
  const place =
    judgement && point && solved ? placeWords(judgement, solved.inputs, plannedOutside(wanted, point, solved)) : null;
  const held = point && solved ? deviationWords(point, wanted, solved.inputs.controlBand) : null;
  return (
    <>
      <SectionHead aside={figures.recoveryBasis ?? undefined}>So far</SectionHead>
      <Row
        label={
          <>
            {stage.target} {values.kind === "leach" ? "extraction" : "recovery"}
          </>
        }
      >
        <b className="text-lg">{pct(figures.recoveryPct)}</b>
      </Row>
      {figures.recoveryRangePct && (
        <Note>
          from {fixed(figures.recoveryRangePct[0], 1)} to {fixed(figures.recoveryRangePct[1], 1)}&#8239;%: an assay is
          censored
        </Note>
      )}
      {stage.gangue !== null && values.kind === "leach" && (
        <Row label={`${stage.gangue} dissolved`}>{pct(figures.gangueDissolvedPct)}</Row>
      )}
      <Row label="Accountability">{pct(figures.accountabilityPct)}</Row>
      {values.kind === "leach" ? (
        <Row label="Acid consumed, gross">
          {figures.acidPerTonne === null ? (
            <span className="font-sans text-muted">open</span>
          ) : (
            withUnit(fixed(figures.acidPerTonne, 1), "kg/t")
          )}
        </Row>
      ) : (
        <Row label="Cementing metal consumed">
          {figures.reagentPerKg === null ? (
            <span className="font-sans text-muted">open</span>
          ) : (
            withUnit(fixed(figures.reagentPerKg, 2), "kg/kg")
          )}
        </Row>
      )}

      <SectionHead className="mt-5" aside={`revision ${campaign.planRevision}`}>
        On the map
      </SectionHead>
      {point ? (
        <>
          <p className="pt-1 font-mono text-lg font-bold">
            pH {fixed(point.pH, 2)}
            <span className="ml-4">{scale.format(point.Eh)}</span>
          </p>
          <Note>
            {scale.label}
            {point.EhUncertainty > 0 && `, ±${withUnit(fixed(point.EhUncertainty * 1000, 0), "mV")}`}.{" "}
            {point.conversion}.
          </Note>
          {acid && <AcidNote acid={acid} />}
          {place && <p className={classes("pt-1", toneClass[place.tone])}>{place.text}</p>}
          {held && <p className={classes("pt-1", held.tone === "bad" ? "text-ink" : "text-muted")}>{held.text}</p>}
          {point.marks.map(({ mark, text }) => (
            <Note key={mark}>{text}</Note>
          ))}
          {comparability && !comparability.comparable && (
            <Remark className="mt-2">Drawn open and counted apart: {comparability.reasons.join("; ")}.</Remark>
          )}
        </>
      ) : (
        <Note className="pt-1">{pointMissing.map(({ label, why }) => `${label}: ${why}`).join("; ")}.</Note>
      )}

      {figures.flags.length > 0 && (
        <>
          <SectionHead className="mt-5">Stands out</SectionHead>
          {figures.flags.map((flag) => (
            <Remark key={flag} className="mt-2">
              {flag}
            </Remark>
          ))}
        </>
      )}

      <SectionHead className="mt-5" aside={missing.length === 0 ? "nothing" : String(missing.length)}>
        Still missing
      </SectionHead>
      {missing.length === 0 ? (
        <Note className="pt-1">Every account of this trial can be closed.</Note>
      ) : (
        <ul>
          {missing.map(({ path, label, why }) => (
            <li key={path} className="hairline py-1 text-sm">
              <Link to={{ hash: sectionOf(path) }} className="no-underline hover:underline">
                {label}
              </Link>
              <span className="text-muted">: {why}</span>
            </li>
          ))}
        </ul>
      )}
    </>
  );
}
