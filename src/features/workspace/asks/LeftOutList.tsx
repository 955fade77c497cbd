import { useState } from "react";
import { Button } from "../../../components/Button";
import { SpeciesName } from "../../../components/Formula";
import { FormulaText } from "../../../components/FormulaText";
import { Select } from "../../../components/Select";
import { TextField } from "../../../components/TextField";
import { leaveOut, noLongerPutBack, putBack } from "../model/edit";
import { useAsking } from "./context";
import { line, lineList } from "./look";

/** Every species that is left out, with its reason and the way back. */
export default function LeftOutList() {
  const { inputs, edit, solution, readOnly } = useAsking();
  const own = new Map(inputs.leftOut.map((l) => [l.species, l.reason]));
  // A species of two metals is refused once for each of them.
  const all = [...new Map((solution?.leftOut ?? []).map((l) => [l.species, l])).values()];
  return (
    <>
      {!readOnly && <LeaveOneOut />}
      <ul className={lineList} aria-label="Species left out">
        {all
          .sort((a, b) => Number(own.has(b.species)) - Number(own.has(a.species)))
          .map(({ species, reason }) => (
            <li key={species} className={line}>
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
        <ul className={lineList} aria-label="Species put back">
          {inputs.putBack.map((id) => (
            <li key={id} className={line}>
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
    </>
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
