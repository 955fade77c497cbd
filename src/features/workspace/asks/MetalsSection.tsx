import { lazy, Suspense, useState } from "react";
import type { PlanMetal } from "../../../../shared/schemas/plan";
import { tenorText, typedFigures } from "../../../../shared/words/tenor";
import { MetalName } from "../../../components/MetalLine";
import { Select } from "../../../components/Select";
import { Note, SectionHead } from "../../../components/text";
import { Term } from "../../../components/Help";
import { classes } from "../../../lib/classes";
import { inputTextExact } from "../../../lib/format";
import { metalOptions } from "../../../lib/metals";
import { amountWord, requirementWord } from "../../../lib/planWords";
import { cssMetalColour, hatchesOf, shuts } from "../../../map/metalStyle";
import { Swatch } from "../../../map/Swatch";
import { addMetal } from "../model/edit";
import { useAsking } from "./context";
import { Refusal } from "./Refusal";

const loadEditor = () => import("./MetalEditor");
const MetalEditor = lazy(loadEditor);
/** A hand comes near. */
const fetchEditor = () => void loadEditor().catch(() => undefined);

/** The metals of the step: what each must be, and how much of it. The list is the map's legend as well. */
export function MetalsSection() {
  const { inputs, edit, data, readOnly } = useAsking();
  const [open, setOpen] = useState<string | null>(null);
  const used = new Set(inputs.metals.map((m) => m.element));
  return (
    <section aria-label="Metals">
      <SectionHead aside={<Term word="requirement">what is asked</Term>}>Metals</SectionHead>
      <Refusal path="metals" />
      <ul>
        {inputs.metals.map((metal, i) => (
          <li key={metal.element} className="hairline">
            <MetalHead
              metal={metal}
              open={open === metal.element}
              onToggle={() => setOpen((was) => (was === metal.element ? null : metal.element))}
            />
            {open === metal.element && (
              <Suspense fallback={null}>
                <MetalEditor metal={metal} index={i} onRemoved={() => setOpen(null)} />
              </Suspense>
            )}
          </li>
        ))}
      </ul>
      {!readOnly && (
        <Select
          label="Add a metal"
          labelText={<span className="text-muted">Add a metal</span>}
          value=""
          placeholder="choose"
          onChange={(element) => {
            edit(addMetal(element));
            setOpen(element);
          }}
          options={metalOptions(data).filter((o) => !used.has(o.value))}
        />
      )}
      <Note className="pt-1">
        <Term word="shutGround">Hatched ground is shut</Term>: that metal is not as required. Open ground is the window.
      </Note>
    </section>
  );
}

const amount = (m: PlanMetal): string =>
  m.entry === "gPerL" ? tenorText(m.value, typedFigures(m.value)) : inputTextExact(m.value);

function MetalHead({ metal, open, onToggle }: { metal: PlanMetal; open: boolean; onToggle: () => void }) {
  const { inputs, focus, onFocus } = useAsking();
  const hatch = hatchesOf(inputs.metals).get(metal.element) ?? null;
  const focused = focus === metal.element;
  const number = inputs.metals.indexOf(metal) + 1;
  return (
    <div className="flex items-baseline gap-2 py-1 pointer-coarse:gap-4 pointer-coarse:py-0">
      <button
        type="button"
        aria-pressed={focused}
        aria-label={`Focus on ${metal.element} on the map`}
        title={`Focus on ${metal.element} (key ${number})`}
        onClick={() => onFocus(focused ? null : metal.element)}
        className={classes(
          "touch-word relative top-0.5 shrink-0",
          focused && "outline-2 outline-offset-1 outline-verdigris",
        )}
      >
        <Swatch hatch={shuts(metal) ? hatch : null} colour={cssMetalColour(metal)} />
      </button>
      <button
        type="button"
        aria-expanded={open}
        onClick={onToggle}
        onPointerEnter={fetchEditor}
        onFocus={fetchEditor}
        className="flex min-w-0 flex-1 flex-wrap items-baseline justify-between gap-x-2 text-left hover:underline pointer-coarse:min-h-11 pointer-coarse:py-3"
      >
        <span className="whitespace-nowrap">
          <MetalName {...metal} />{" "}
          <span className={metal.role === "watched" ? "text-muted" : undefined}>
            {metal.role === "watched" ? "watched" : requirementWord[metal.requirement]}
          </span>
        </span>
        <span className="ml-auto whitespace-nowrap">
          <span className="text-muted">{amountWord(metal)}</span> <span className="font-mono">{amount(metal)}</span>
        </span>
      </button>
    </div>
  );
}
