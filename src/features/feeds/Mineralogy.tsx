import { refusalOf } from "../../../shared/schemas/entry";
import type { FeedMineral, HeadAssay } from "../../../shared/schemas/feed";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { EntryGrid } from "../../components/EntryGrid";
import type { GridColumn } from "../../components/entryGridModel";
import { SpeciesName } from "../../components/Formula";
import { significant } from "../../lib/format";
import { placedShares } from "./feedModel";

const columns = (data: ChemicalData | undefined, heads: readonly HeadAssay[]): GridColumn<FeedMineral>[] => [
  {
    id: "mineral",
    kind: "text",
    header: "mineral",
    label: "mineral",
    width: "15em",
    words: true,
    usual: data?.tables.species.filter(({ phase }) => phase === "s").map(({ id }) => id) ?? [],
    get: (m) => m.mineral,
    set: (m, mineral) => ({ ...m, mineral }),
    problem: (m) => (m.mineral.trim() === "" ? "the mineral is missing" : null),
  },
  {
    id: "known",
    kind: "shown",
    header: "in the library",
    label: "in the library",
    width: "18em",
    show: ({ mineral }) => {
      const row = data?.species.get(mineral)?.row;
      if (row)
        return (
          <>
            <SpeciesName id={mineral} /> <span className="text-muted">{row.name}</span>
          </>
        );
      return <span className="text-muted">{mineral.trim() === "" ? "" : "by name only"}</span>;
    },
  },
  {
    id: "element",
    kind: "text",
    header: "metal",
    label: "metal",
    width: "5em",
    words: true,
    usual: [...new Set(heads.map(({ element }) => element).filter(Boolean))],
    get: (m) => m.element,
    set: (m, element) => ({ ...m, element }),
    problem: (m) => (m.element.trim() === "" ? "which metal's share is meant?" : null),
  },
  {
    id: "share",
    kind: "text",
    header: "its share",
    label: "share of that metal",
    under: "%",
    width: "9em",
    get: (m) => m.share.text,
    set: (m, text) => ({ ...m, share: { ...m.share, text } }),
    problem: (m) => refusalOf(m.share, "share"),
  },
];

const blank = (rows: readonly FeedMineral[]): FeedMineral => ({
  mineral: "",
  element: rows.at(-1)?.element ?? "",
  share: { text: "", unit: "%" },
});

/** Which minerals hold each metal, and how much of it each. */
export function Mineralogy({
  minerals,
  heads,
  data,
  onChange,
  readOnly,
}: {
  minerals: FeedMineral[];
  heads: readonly HeadAssay[];
  data: ChemicalData | undefined;
  onChange: (minerals: FeedMineral[]) => void;
  readOnly: boolean;
}) {
  const placed = placedShares(minerals);
  return (
    <>
      <EntryGrid
        caption="Minerals"
        rowName="mineral"
        rows={minerals}
        columns={columns(data, heads)}
        blank={blank}
        onChange={onChange}
        readOnly={readOnly}
        emptyText="No mineral described yet."
      />
      {placed.length > 0 && (
        <p className="mt-2 text-sm text-muted">
          {placed.map(({ element, sum, over }, i) => (
            <span key={element} className={over ? "text-signal" : undefined}>
              {i > 0 && ", "}
              {significant(sum, 4)} % of the {element} placed
            </span>
          ))}
        </p>
      )}
    </>
  );
}
