import { lazy, Suspense, useMemo } from "react";
import { type PlanInputs } from "../../../../shared/schemas/plan";
import { solidsBases } from "../../../../shared/schemas/problem";
import { speciesHolding } from "../../../../shared/selection/components";
import { Button } from "../../../components/Button";
import { Segmented } from "../../../components/choice";
import { SpeciesName } from "../../../components/Formula";
import { Term } from "../../../components/Help";
import { Select } from "../../../components/Select";
import { Note, SectionHead } from "../../../components/text";
import { toggleIn } from "../model/edit";
import { useAsking } from "./context";
import { Fold } from "./Fold";
import { line, lineList } from "./look";
import { Refusal } from "./Refusal";

const LeftOutList = lazy(() => import("./LeftOutList"));

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
        <ul className={lineList} aria-label="Feed minerals">
          {inputs.feedMinerals.map((id) => (
            <li key={id} className={line}>
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
  const { solution } = useAsking();
  // A species of two metals is refused once for each of them.
  const count = new Set((solution?.leftOut ?? []).map((l) => l.species)).size;
  return (
    <Fold className="mt-1" title={count === 0 ? "No species is left out" : `${count} species left out, with reasons`}>
      <Suspense fallback={null}>
        <LeftOutList />
      </Suspense>
    </Fold>
  );
}
