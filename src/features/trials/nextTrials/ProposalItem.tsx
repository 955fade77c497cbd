import type { Caution } from "../../../../shared/hazards/rules";
import { Button } from "../../../components/Button";
import { FormulaText } from "../../../components/FormulaText";
import { NumberField } from "../../../components/NumberField";
import { classes } from "../../../lib/classes";
import { fixed } from "../../../lib/format";
import type { PotentialScale } from "../../../lib/potential";
import type { Point } from "../../../../shared/solution";
import type { ProposalStore } from "../../../map/proposalStore";
import { useTold } from "../../../map/trialStore";
import type { Proposal } from "./nextModel";

interface ItemProps {
  proposal: Proposal;
  reason: string;
  /** beyond those of the set point */
  cautions: readonly Caution[];
  /** an earlier proposal that the same caution stands with */
  alike: (caution: Caution) => number | null;
  store: ProposalStore;
  scale: PotentialScale;
  moving: boolean;
  onMoving: (on: boolean) => void;
  onMove: (at: Point) => void;
  onDrop: () => void;
  /** the only one left is not dropped: hiding does that */
  last: boolean;
}

/** One proposed condition: its number as on the map, where it stands, and why. */
export function ProposalItem({
  proposal,
  reason,
  cautions,
  alike,
  store,
  scale,
  moving,
  onMoving,
  onMove,
  onDrop,
  last,
}: ItemProps) {
  const { n, pH, Eh, inWindow } = proposal;
  const lit = useTold(store.lit) === n;
  const light = (on: boolean) => store.lit.set(on ? n : null);
  return (
    <li
      className={classes("hairline flex gap-2 py-1.5", lit && "bg-tint")}
      onPointerEnter={() => light(true)}
      onPointerLeave={() => light(false)}
    >
      <span
        aria-hidden
        className="mt-0.5 h-[18px] w-[18px] shrink-0 border-2 border-verdigris bg-sheet text-center font-mono text-xs leading-[14px] font-bold text-verdigris"
      >
        {n}
      </span>
      <div className="min-w-0 flex-1">
        <div className="flex items-baseline justify-between gap-2">
          <span className="font-mono whitespace-nowrap" title={`Eh in ${scale.label}`}>
            pH {fixed(pH, 2)}, {scale.format(Eh)}
          </span>
          <span className="no-print flex gap-2.5">
            <Button
              kind="quiet"
              className="h-auto!"
              aria-label={`Move proposal ${n}`}
              aria-expanded={moving}
              onClick={() => onMoving(!moving)}
            >
              {moving ? "done" : "move"}
            </Button>
            {!last && (
              <Button kind="quiet" className="h-auto!" aria-label={`Drop proposal ${n}`} onClick={onDrop}>
                drop
              </Button>
            )}
          </span>
        </div>
        <p className={classes("text-sm", inWindow ? "text-muted" : "font-bold text-signal")}>{reason}</p>
        {cautions.map((c) => (
          <p key={c.code} role="note" className="mt-0.5 border-l-4 border-signal pl-2 text-sm">
            <b>
              <FormulaText text={c.agents.join(", ")} />.
            </b>{" "}
            {alike(c) === null ? <FormulaText text={c.text} /> : `As at ${alike(c)}.`}
          </p>
        ))}
        {moving && (
          <div className="no-print pt-1">
            <NumberField
              label={`pH of proposal ${n}`}
              labelText="pH"
              value={Number(pH.toFixed(3))}
              onCommit={(next) => onMove([next, Eh])}
              step={0.02}
              min={-2}
              max={16}
            />
            <NumberField
              label={`Eh of proposal ${n}`}
              labelText="Eh"
              value={Number(scale.toShown(Eh).toFixed(scale.digits + 1))}
              onCommit={(next) => onMove([pH, scale.fromShown(next)])}
              unit={scale.label}
              step={scale.unit === "V" ? 0.005 : 5}
            />
          </div>
        )}
      </div>
    </li>
  );
}
