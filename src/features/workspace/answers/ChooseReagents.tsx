import { Popover } from "radix-ui";
import { type Reagent, reagents } from "../../../../shared/reach/reagents";
import type { PresetName } from "../../../../shared/schemas/plan";
import { Button } from "../../../components/Button";
import { Check } from "../../../components/choice";
import { Formula } from "../../../components/Formula";

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
    <Popover.Root>
      <Popover.Trigger asChild>
        <Button kind="quiet" className="no-print h-auto! font-normal!">
          choose
        </Button>
      </Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          align="end"
          sideOffset={6}
          collisionPadding={12}
          className="z-50 max-h-[60vh] w-[300px] overflow-y-auto border border-ink bg-paper px-4 py-2 text-base text-ink"
        >
          <div className="flex items-baseline justify-between">
            <p className="font-mono text-sm font-bold">Reach of</p>
            <Button kind="quiet" onClick={() => onChange(null)}>
              the usual ones
            </Button>
          </div>
          {group("common in this liquor", common)}
          {group("others", others)}
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}
