import { Select as Radix } from "radix-ui";
import type { ReactElement } from "react";
import type { SelectOption } from "./Select";

export interface SelectListProps {
  /** stands where the closed control stood */
  trigger: ReactElement;
  value: string;
  onChange: (value: string) => void;
  options: readonly SelectOption<string>[];
  onClose: () => void;
}

/** The open list of a Select. */
export default function SelectList({ trigger, value, onChange, options, onClose }: SelectListProps) {
  return (
    <Radix.Root value={value} onValueChange={onChange} open onOpenChange={(open) => !open && onClose()}>
      <Radix.Trigger asChild>{trigger}</Radix.Trigger>
      <Radix.Portal>
        <Radix.Content
          position="popper"
          sideOffset={2}
          // The Enter that chooses must not press the control that gets the focus back.
          onKeyDown={(event) => event.key === "Enter" && event.preventDefault()}
          className="z-50 max-h-[min(340px,var(--radix-select-content-available-height))] max-w-[420px] min-w-(--radix-select-trigger-width) overflow-y-auto border border-ink bg-paper text-base text-ink"
        >
          {/* The list scrolls, not the frame in it: of a list under a control everybody knows that arrow keys walk it. */}
          <Radix.Viewport className="py-1" style={{ overflow: "visible" }}>
            {options.map((option) => (
              <Radix.Item
                key={option.value}
                value={option.value}
                disabled={option.disabled ?? false}
                {...(option.text === undefined ? {} : { textValue: option.text })}
                className="cursor-pointer px-3 py-1 -outline-offset-2 data-[disabled]:opacity-50 data-[highlighted]:bg-tint data-[state=checked]:font-bold"
              >
                <Radix.ItemText>{option.label}</Radix.ItemText>
                {option.note !== undefined && <div className="text-sm font-normal text-muted">{option.note}</div>}
              </Radix.Item>
            ))}
          </Radix.Viewport>
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
