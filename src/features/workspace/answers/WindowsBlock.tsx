import type { Solution } from "../../../../shared/solution";
import { SectionHead, Note } from "../../../components/text";
import { classes } from "../../../lib/classes";
import { fixed } from "../../../lib/format";
import type { PotentialScale } from "../../../lib/potential";
import { windowName } from "../../../map/view";
import { requirementWord } from "../../../lib/planWords";
import { Fragment } from "react";

/** Where several windows are open: which one the answers speak of. */
export function WindowsBlock({
  solution,
  chosen,
  onChoose,
  scale,
}: {
  solution: Solution;
  chosen: number;
  onChoose: (index: number) => void;
  scale: PotentialScale;
}) {
  if (solution.windows.length < 2) return null;
  return (
    <section aria-label="Windows" className="mb-4">
      <SectionHead aside="deepest first">{solution.windows.length} windows are open</SectionHead>
      <ul>
        {solution.windows.map((window, i) => (
          <li key={i} className="hairline">
            <button
              type="button"
              aria-pressed={i === chosen}
              onClick={() => onChoose(i)}
              className={classes(
                "flex w-full items-baseline justify-between gap-3 px-1 py-1 text-left hover:bg-tint/60",
                i === chosen && "bg-tint font-bold",
              )}
            >
              <span>
                {windowName(i)}{" "}
                <span className="font-mono font-normal">
                  pH {fixed(window.pH[0], 2)} to {fixed(window.pH[1], 2)}
                </span>
              </span>
              <span className="font-mono font-normal whitespace-nowrap">
                {fixed(scale.toShown(window.Eh[0]), scale.digits)} to {scale.format(window.Eh[1])}
              </span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}

/** No window: which requirements cannot hold together, in words, and what may open one. */
export function ConflictsBlock({
  solution,
  metalName,
}: {
  solution: Solution;
  metalName: (element: string) => string;
}) {
  const sets = solution.conflicts;
  return (
    <section aria-label="No window">
      <SectionHead>No window is open</SectionHead>
      {sets.length === 0 ? (
        <p className="py-1">The frame and the water lines leave no ground where all metals are as required.</p>
      ) : (
        <ul>
          {sets.map((set) => (
            <li key={set.map((c) => c.metal).join()} className="hairline py-1">
              {set.length === 1 && set[0] ? (
                <>
                  Nowhere on this map is <b>{metalName(set[0].metal)}</b> {requirementWord[set[0].requirement]}.
                </>
              ) : (
                <>
                  {set.map((c, i) => (
                    <Fragment key={c.metal}>
                      {i > 0 && (i === set.length - 1 ? " and " : ", ")}
                      <b>{metalName(c.metal)}</b> {requirementWord[c.requirement]}
                    </Fragment>
                  ))}{" "}
                  cannot hold together.
                </>
              )}
            </li>
          ))}
        </ul>
      )}
      <Note className="py-1">
        A wider frame, another temperature or lixiviant, the other solids basis, or a higher limit for the metal that
        stands in the way may open one: move them and watch the map.
      </Note>
    </section>
  );
}
