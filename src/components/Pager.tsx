import { fixed } from "../lib/format";
import { Button } from "./Button";

/** Which rows of a list are shown, and the way to the others. */
export function Pager({
  what,
  total,
  limit,
  offset,
  onOffset,
}: {
  /** "trials" */
  what: string;
  total: number;
  limit: number;
  offset: number;
  onOffset: (offset: number) => void;
}) {
  if (total <= limit && offset === 0) return null;
  const last = Math.min(total, offset + limit);
  return (
    <nav aria-label={`Pages of ${what}`} className="flex items-center gap-4 border-t border-rule py-1.5 text-sm">
      <span className="font-mono">
        {total === 0 ? "0" : `${fixed(offset + 1, 0)} to ${fixed(last, 0)}`}
        <span className="text-muted"> of {fixed(total, 0)}</span>
      </span>
      <span className="flex-1" />
      <Button
        kind="quiet"
        disabled={offset === 0}
        onClick={() => onOffset(Math.max(0, offset - limit))}
        aria-label={`Previous ${what}`}
      >
        previous {limit}
      </Button>
      <Button
        kind="quiet"
        disabled={last >= total}
        onClick={() => onOffset(offset + limit)}
        aria-label={`Next ${what}`}
      >
        next {limit}
      </Button>
    </nav>
  );
}
