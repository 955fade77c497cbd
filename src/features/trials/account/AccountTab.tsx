import { useDeferredValue, useMemo, useState } from "react";
import { Segmented } from "../../../components/choice";
import { Select } from "../../../components/Select";
import { Note } from "../../../components/text";
import { accountOf, metalsOf } from "../model/workings";
import { useRecording } from "../record/context";
import { CementationSheet } from "./CementationSheet";
import { LeachSheet } from "./LeachSheet";
import { ReagentTable } from "./ReagentTable";

/** The account of one metal: every basis side by side, with formula and numbers, from the record as it stands. */
export function AccountTab() {
  const { values, feed, stage, data } = useRecording();
  const record = useDeferredValue(values);
  const metals = useMemo(() => (feed && stage ? metalsOf(record, feed, stage, data) : []), [record, feed, stage, data]);
  const [wanted, setWanted] = useState<string>();
  const metal = metals.find((m) => m === wanted) ?? metals[0];
  const found = useMemo(
    () => (feed && metal !== undefined ? accountOf(record, feed, metal, data) : null),
    [record, feed, metal, data],
  );
  if (!found || metal === undefined)
    return (
      <Note className="pt-3">
        {stage
          ? "No metal of this trial was assayed yet."
          : "The campaign has no such stage any more: choose another one."}
      </Note>
    );
  return (
    <div className="min-h-0 flex-1 overflow-y-auto pb-16">
      <div className="flex flex-wrap items-center gap-3 pb-3">
        {metals.length > 8 ? (
          <Select
            label="Metal"
            layout="bare"
            value={metal}
            onChange={setWanted}
            options={metals.map((m) => ({ value: m, label: m }))}
          />
        ) : (
          <Segmented
            label="Metal"
            value={metal}
            onChange={setWanted}
            options={metals.map((m) => ({
              value: m,
              label: <span className={m === stage?.target ? "font-bold" : undefined}>{m}</span>,
            }))}
          />
        )}
        <Note>
          {metal === stage?.target ? "target of the stage" : metal === stage?.gangue ? "gangue of the stage" : ""}
        </Note>
      </div>
      {found.kind === "leach" ? <LeachSheet account={found.account} /> : <CementationSheet account={found.account} />}
      <ReagentTable account={found.reagents} metal={metal} kind={found.kind} />
    </div>
  );
}
