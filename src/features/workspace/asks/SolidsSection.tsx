import { useMemo, useState } from "react";
import { type PlanInputs } from "../../../../shared/schemas/plan";
import { solidsBases } from "../../../../shared/schemas/problem";
import { speciesHolding } from "../../../../shared/selection/components";
import { Button } from "../../../components/Button";
import { Segmented } from "../../../components/choice";
import { SpeciesName } from "../../../components/Formula";
import { FormulaText } from "../../../components/FormulaText";
import { Term } from "../../../components/Help";
import { Select } from "../../../components/Select";
import { TextField } from "../../../components/TextField";
import { Note, SectionHead } from "../../../components/text";
import { leaveOut, noLongerPutBack, putBack, toggleIn } from "../model/edit";
import { useAsking } from "./context";
import { Fold } from "./Fold";
import { Refusal } from "./Refusal";

const meaning: Readonly<Record<PlanInputs["solidsBasis"], string>> = {
  feed: "The minerals named for the feed count; products as those that form in hours.",
  fresh: "Solids that form in hours count: ferrihydrite before goethite.",
  aged: "The most stable solids count, as after weeks or months.",
};

/** Which solids count, and every species that does not, with the reason. */
export function SolidsSection() {
  const { inputs, edit, readOnly } = useAsking();
  return (
    <section aria-label="Solids basis" className="mt-5">
      <SectionHead aside={<Term word="solidsBasis">what counts</Term>}>Solids basis</SectionHead>
      {!readOnly && (
        <Segmented
          label="Solids basis"
          value={inputs.solidsBasis}
          onChange={(solidsBasis) => edit((p) => ({ ...p, solidsBasis }))}
          options={solidsBases.map((basis) => ({ value: basis, label: basis }))}
          className="my-1.5"
        />
      )}
      <Note>
        {readOnly && <b>{inputs.solidsBasis}. </b>}
        {meaning[inputs.solidsBasis]}
      </Note>
      <FeedMinerals />
      <Refusal path="leftOut" />
      <Refusal path="putBack" />
      <LeftOut />
    </section>
  );
}

const list = "text-sm";
const item = "hairline flex items-baseline justify-between gap-2 py-0.5";

function FeedMinerals() {
  const { inputs, edit, data, readOnly } = useAsking();
  const { metals, feedMinerals } = inputs;
  const options = useMemo(() => {
    const minerals = metals
      .flatMap((m) => speciesHolding(data, m.element))
      .filter((s) => s.phase === "s" && Object.keys(s.composition).length > 1 && !feedMinerals.includes(s.id));
    return [...new Map(minerals.map((s) => [s.id, s])).values()].map((s) => ({
      value: s.id,
      label: <SpeciesName id={s.id} />,
      text: `${s.name} ${s.id}`,
      note: s.name,
    }));
  }, [metals, feedMinerals, data]);
  return (
    <div className="mt-1">
      {inputs.feedMinerals.length > 0 && (
        <ul className={list} aria-label="Feed minerals">
          {inputs.feedMinerals.map((id) => (
            <li key={id} className={item}>
              <span>
                <SpeciesName id={id} /> <span className="text-muted">in the feed</span>
              </span>
              {!readOnly && (
                <Button kind="quiet" className="h-auto!" onClick={() => edit(toggleIn("feedMinerals", id))}>
                  remove
                </Button>
              )}
            </li>
          ))}
        </ul>
      )}
      <Refusal path="feedMinerals" />
      {!readOnly && (
        <Select
          label="Name a feed mineral"
          labelText={<span className="text-muted">Name a feed mineral</span>}
          value=""
          onChange={(id) => edit(toggleIn("feedMinerals", id))}
          options={options}
        />
      )}
    </div>
  );
}

function LeftOut() {
  const { inputs, edit, solution, readOnly } = useAsking();
  const own = new Map(inputs.leftOut.map((l) => [l.species, l.reason]));
  // A species of two metals is refused once for each of them.
  const all = [...new Map((solution?.leftOut ?? []).map((l) => [l.species, l])).values()];
  return (
    <Fold
      className="mt-1"
      title={all.length === 0 ? "No species is left out" : `${all.length} species left out, with reasons`}
    >
      {!readOnly && <LeaveOneOut />}
      <ul className={list} aria-label="Species left out">
        {all
          .sort((a, b) => Number(own.has(b.species)) - Number(own.has(a.species)))
          .map(({ species, reason }) => (
            <li key={species} className={item}>
              <span className="min-w-0">
                <SpeciesName id={species} withPhase />{" "}
                <span className="text-muted">
                  <FormulaText text={own.get(species) ?? reason} />
                </span>
              </span>
              {!readOnly && !reason.includes("second metal") && !reason.endsWith("has no total") && (
                <Button kind="quiet" className="h-auto! shrink-0" onClick={() => edit(putBack(species))}>
                  put back
                </Button>
              )}
            </li>
          ))}
      </ul>
      {inputs.putBack.length > 0 && (
        <ul className={list} aria-label="Species put back">
          {inputs.putBack.map((id) => (
            <li key={id} className={item}>
              <span>
                <SpeciesName id={id} withPhase /> <span className="text-muted">put back by the plan</span>
              </span>
              {!readOnly && (
                <Button kind="quiet" className="h-auto!" onClick={() => edit(noLongerPutBack(id))}>
                  undo
                </Button>
              )}
            </li>
          ))}
        </ul>
      )}
    </Fold>
  );
}

/** A species that rules a field can be left out, once somebody says why. */
function LeaveOneOut() {
  const { edit, solution } = useAsking();
  const [species, setSpecies] = useState("");
  const [reason, setReason] = useState("");
  const ruling = [...new Set((solution?.fields ?? []).map((f) => f.species))].sort();
  return (
    <div className="py-1">
      <Select
        label="Leave out a species that rules a field"
        labelText={<span className="text-muted">Leave one out</span>}
        value={species}
        onChange={setSpecies}
        options={ruling.map((id) => ({ value: id, label: <SpeciesName id={id} withPhase />, text: id }))}
      />
      {species !== "" && (
        <form
          className="mt-1"
          onSubmit={(event) => {
            event.preventDefault();
            if (reason.trim() === "") return;
            edit(leaveOut(species, reason.trim()));
            setSpecies("");
            setReason("");
          }}
        >
          <TextField
            label="Why it does not count here"
            value={reason}
            maxLength={200}
            onChange={(event) => setReason(event.target.value)}
          />
          <div className="mt-1 flex gap-3">
            <Button type="submit" disabled={reason.trim() === ""}>
              Leave out
            </Button>
            <Button kind="quiet" onClick={() => setSpecies("")}>
              cancel
            </Button>
          </div>
        </form>
      )}
    </div>
  );
}
