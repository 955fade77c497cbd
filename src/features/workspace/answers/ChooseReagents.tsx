import { useRef } from "react";
import { type Reagent, reagents } from "../../../../shared/reach/reagents";
import type { PresetName } from "../../../../shared/schemas/plan";
import { Button } from "../../../components/Button";
import { Check } from "../../../components/choice";
import { Formula } from "../../../components/Formula";
import { lateFailure, useLate } from "../../../components/useLate";

const loadSheet = () => import("../../../components/PopoverSheet");

/** Picks the reagents whose reach is drawn; those common in the liquor stand first. */
export function ChooseReagents({
  preset,
  value,
  onChange,
}: {
  preset: PresetName;
  value: readonly string[];
  /** null goes back to what is usual */
  onChange: (ids: string[] | null) => void;
}) {
  const button = useRef<HTMLButtonElement>(null);
  const { Part: Sheet, failed, open, close, near } = useLate(loadSheet);
  const common = reagents.filter((r) => r.usedIn.includes(preset));
  const others = reagents.filter((r) => !r.usedIn.includes(preset));
  const toggle = (id: string) => onChange(value.includes(id) ? value.filter((x) => x !== id) : [...value, id]);
  const group = (title: string, list: readonly Reagent[]) => (
    <fieldset>
      <legend className="pt-1 font-mono text-xs font-bold">{title}</legend>
      {list.map((r) => (
        <Check key={r.id} label={r.name} checked={value.includes(r.id)} onChange={() => toggle(r.id)}>
          <Formula formula={r.name} /> <span className="text-sm text-muted">{r.kind}</span>
        </Check>
      ))}
    </fieldset>
  );
  return (
    <>
      <Button
        ref={button}
        kind="quiet"
        className="no-print h-auto! font-normal!"
        aria-haspopup="dialog"
        aria-expanded={Sheet !== null}
        title={failed ? lateFailure : undefined}
        onClick={Sheet ? close : open}
        {...near}
      >
        choose
      </Button>
      {Sheet && (
        <Sheet
          anchor={button}
          onClose={close}
          label="Reagents whose reach is shown"
          align="end"
          className="max-h-[min(60vh,var(--radix-popover-content-available-height))] w-[300px] overflow-y-auto px-4 py-2"
        >
          <div className="flex items-baseline justify-between">
            <p className="font-mono text-sm font-bold">Reach of</p>
            <Button kind="quiet" onClick={() => onChange(null)}>
              the usual ones
            </Button>
          </div>
          {group("common in this liquor", common)}
          {group("others", others)}
        </Sheet>
      )}
    </>
  );
}
