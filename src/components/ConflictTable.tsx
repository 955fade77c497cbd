import type { ReactNode } from "react";
import { Segmented } from "./choice";

export type Whose = "yours" | "theirs";

export interface ConflictRow {
  path: string;
  what: string;
  base: string;
  yours: string;
  theirs: string;
}

/** What two people changed to different things, line by line, each to be decided. */
export function ConflictTable({
  headers,
  rows,
  choices,
  onChoose,
  show = (text) => text,
}: {
  headers: readonly [what: string, base: string, yours: string, theirs: string];
  rows: readonly ConflictRow[];
  choices: Readonly<Record<string, Whose>>;
  onChoose: (path: string, choice: Whose) => void;
  /** how words are set */
  show?: (text: string) => ReactNode;
}) {
  return (
    <table className="w-full table-fixed text-sm">
      <thead>
        <tr className="text-left font-mono text-xs">
          {headers.map((header, i) => (
            <th key={header} scope="col" className={`border-b border-ink py-1 pr-3 ${i === 0 ? "w-[22%]" : ""}`}>
              {header}
            </th>
          ))}
          <th scope="col" className="w-[138px] border-b border-ink py-1">
            keep
          </th>
        </tr>
      </thead>
      <tbody>
        {rows.map(({ path, what, base, yours, theirs }) => (
          <tr key={path} className="border-b border-rule align-baseline">
            <td className="py-1.5 pr-3 break-words">{show(what)}</td>
            {[base, yours, theirs].map((text, i) => (
              <td key={i} className={`py-1.5 pr-3 font-mono break-words ${i === 0 ? "text-muted" : ""}`}>
                {show(text)}
              </td>
            ))}
            <td className="py-1.5">
              <Segmented<Whose | "open">
                label={`Keep for ${what}`}
                value={choices[path] ?? "open"}
                onChange={(choice) => choice !== "open" && onChoose(path, choice)}
                options={[
                  { value: "yours", label: "mine" },
                  { value: "theirs", label: "theirs" },
                ]}
              />
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
