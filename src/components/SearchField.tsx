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
    <span className={classes("relative inline-block w-60", className)}>
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
        className="h-7 w-full rounded-sm border border-muted bg-sheet pr-12 pl-2 text-base [&::-webkit-search-cancel-button]:hidden"
      />
      {value !== "" && (
        <button
          type="button"
          onClick={() => onChange("")}
          className="absolute inset-y-0 right-0 rounded-sm px-2 text-sm text-muted hover:text-ink"
        >
          clear
        </button>
      )}
    </span>
  );
}
