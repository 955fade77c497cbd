import { useId } from "react";
import type { SweepFrame } from "../../../../shared/whatif/sweep";
import { cssMetalColour, hatchesOf } from "../../../map/metalStyle";
import type { MapMetal } from "../../../map/view";

const [W, H] = [150, 112];

/** One setting as a small map: shut ground hatched in the plan's hatches, windows lit, the set point of the best one. */
export function SmallMap({
  frame: { solution, setPoint },
  metals,
}: {
  frame: SweepFrame;
  metals: readonly MapMetal[];
}) {
  const id = useId();
  const { pH, Eh } = solution.frame;
  const x = (p: number) => ((p - pH[0]) / (pH[1] - pH[0])) * W;
  const y = (e: number) => H - ((e - Eh[0]) / (Eh[1] - Eh[0])) * H;
  const path = (
    outlines: readonly {
      outer: readonly (readonly [number, number])[];
      holes: readonly (readonly (readonly [number, number])[])[];
    }[],
  ) =>
    // prettier-ignore
    outlines
      .flatMap((o) => [o.outer, ...o.holes])
      .map((ring) => `M${ring.map((p) => `${x(p[0]).toFixed(2)} ${y(p[1]).toFixed(2)}`).join("L")}Z`)
      .join("");
  const hatches = hatchesOf(metals);
  return (
    <svg viewBox={`0 0 ${W} ${H}`} aria-hidden className="block h-auto w-full border border-ink bg-sheet">
      <defs>
        {metals.map((metal) => {
          const angle = { "/": -45, "\\": 45, "|": 90 }[hatches.get(metal.element)?.shape as string] ?? 0;
          return (
            <pattern
              key={metal.element}
              id={`${id}${metal.element}`}
              width={6}
              height={6}
              patternUnits="userSpaceOnUse"
              patternTransform={`rotate(${angle})`}
            >
              <path d="M0 3H6" stroke={cssMetalColour(metal)} strokeWidth={0.7} />
            </pattern>
          );
        })}
      </defs>
      <path d={path(solution.windows.flatMap((w) => w.polygons))} fill="var(--color-tint)" />
      {metals.map((metal) => (
        <path
          key={metal.element}
          d={path(solution.shut?.find((s) => s.metal === metal.element)?.polygons ?? [])}
          fill={`url(#${id}${metal.element})`}
          fillRule="evenodd"
        />
      ))}
      <path
        d={path(solution.windows.flatMap((w) => w.polygons))}
        fill="none"
        stroke="var(--color-verdigris)"
        strokeWidth={1.6}
      />
      {setPoint && <circle cx={x(setPoint.pH)} cy={y(setPoint.Eh)} r={3} fill="var(--color-verdigris)" />}
    </svg>
  );
}
