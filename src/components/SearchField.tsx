import { classes } from "../lib/classes";

/** Narrows the list beside it while one types; Escape empties it. */
export function SearchField({
  label,
  placeholder,
  value,
  onChange,
  className,
}: {
  label: string;
  placeholder?: string;
  value: string;
  onChange: (value: string) => void;
  className?: string;
}) {
  return (
    <input
      type="search"
      aria-label={label}
      placeholder={placeholder}
      value={value}
      autoComplete="off"
      spellCheck={false}
      onChange={(event) => onChange(event.target.value)}
      onKeyDown={(event) => {
        if (event.key === "Escape" && value !== "") {
          event.stopPropagation();
          onChange("");
        }
      }}
      className={classes("h-7 w-60 rounded-sm border border-muted bg-sheet px-2 text-base", className)}
    />
  );
}
