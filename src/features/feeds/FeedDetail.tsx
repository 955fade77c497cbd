import type { FeedRow } from "../../../shared/schemas/feed";
import { readEntry, type Entry } from "../../../shared/entry/readEntry";
import { Button, ButtonLink } from "../../components/Button";
import { SpeciesName } from "../../components/Formula";
import { FormulaText } from "../../components/FormulaText";
import { ErrorNote } from "../../components/status";
import { Note, Row, SectionHead } from "../../components/text";
import { useRestoreFeed } from "../../lib/feeds";
import { counted } from "../../lib/format";
import { useMay } from "../../lib/session";
import { unitText } from "../../lib/units";
import { headsOf, placedShares } from "./feedModel";

/** The feed in hand, as one reads it before a trial. */
export function FeedDetail({ feed, onOpen }: { feed: FeedRow; onOpen: () => void }) {
  const mayWrite = useMay("review");
  const mayPlan = useMay("writePlans");
  const restore = useRestoreFeed();
  const heads = headsOf(feed.heads);
  return (
    <aside
      aria-label={`Feed ${feed.name}`}
      className="w-[300px] shrink-0 overflow-y-auto border-l border-rule px-5 pt-3 pb-6 lg:w-[372px]"
    >
      <h2 className="text-lg">{feed.name}</h2>
      {feed.invented && <Note>Invented data, for demonstration.</Note>}
      {feed.description !== "" && <p className="mt-1">{feed.description}</p>}
      <div className="mt-3 flex flex-wrap gap-2">
        {feed.deletedAt === null ? (
          <>
            <Button kind="primary" onClick={onOpen}>
              {mayWrite ? "Open to edit" : "Open"}
            </Button>
            {mayPlan && <ButtonLink to={`/plans?feed=${encodeURIComponent(feed.id)}`}>Plan a leach of it</ButtonLink>}
          </>
        ) : (
          mayWrite && (
            <Button disabled={restore.isPending} onClick={() => restore.mutate(feed)}>
              Restore
            </Button>
          )
        )}
      </div>
      {restore.error && <ErrorNote className="mt-2" doing="Not restored" error={restore.error} />}
      <SectionHead className="mt-5" aside={counted(feed.trialCount, "trial")}>
        Heads
      </SectionHead>
      {heads.length === 0 && <Note className="py-1">No head assay yet: no account can be closed without one.</Note>}
      {heads.map(({ element, head, remark }) => (
        <Row
          key={element}
          label={<b>{element}</b>}
          below={[head?.laboratory, head?.method, remark].filter(Boolean).join("; ") || undefined}
        >
          {head ? typed(head.value) : "none marked"}
        </Row>
      ))}
      <SectionHead className="mt-5">Minerals</SectionHead>
      {feed.minerals.length === 0 && <Note className="py-1">Not described.</Note>}
      {feed.minerals.map(({ mineral, element, share }, i) => (
        <Row
          key={i}
          label={
            <>
              <SpeciesName id={mineral} /> <span className="text-muted">holds of the {element}</span>
            </>
          }
        >
          {typed(share)}
        </Row>
      ))}
      {placedShares(feed.minerals).some(({ over }) => over) && (
        <Note className="py-1">Some shares add up to more than 100 %.</Note>
      )}
      <SectionHead className="mt-5">As received</SectionHead>
      <Row label={<FormulaText text="Gangue carbonate, as CaCO3" />}>{typed(feed.carbonate)}</Row>
      <Row label="Moisture, of the wet mass">{typed(feed.moisture)}</Row>
      <Row label="P80">{typed(feed.p80)}</Row>
      <Row label="Density of the solids">{typed(feed.solidDensity)}</Row>
    </aside>
  );
}

const typed = ({ text, unit }: Entry) =>
  readEntry(text).kind === "blank" ? (
    <span className="font-sans text-muted">not measured</span>
  ) : (
    `${text.trim()}\u2009${unitText(unit)}`
  );
