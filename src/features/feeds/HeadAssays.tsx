import { unitsOf } from "../../../shared/entry/quantities";
import { refusalOf } from "../../../shared/schemas/entry";
import type { HeadAssay } from "../../../shared/schemas/feed";
import { EntryGrid } from "../../components/EntryGrid";
import type { GridColumn } from "../../components/entryGridModel";
import { unitText } from "../../lib/units";
import { headsOf, markHead } from "./feedModel";

const units = unitsOf("solidAssay").map((unit) => ({ value: unit, label: unitText(unit) }));

const blank = (rows: readonly HeadAssay[]): HeadAssay => {
  const last = rows.at(-1);
  return {
    element: "",
    value: { text: "", unit: last?.value.unit ?? "%" },
    method: last?.method ?? "",
    laboratory: last?.laboratory ?? "",
    head: false,
  };
};

const columns = (rows: readonly HeadAssay[]): GridColumn<HeadAssay>[] => [
  {
    id: "element",
    kind: "text",
    header: "element",
    label: "element",
    width: "6em",
    words: true,
    usual: ["Zn", "Cu", "Fe", "Pb", "Cd", "Co", "Ni", "Mn", "Ag", "Au", "As", "Ca", "Mg", "S"],
    get: (h) => h.element,
    set: (h, element) => ({ ...h, element }),
    problem: (h) => (h.element.trim() === "" && h.value.text.trim() !== "" ? "the element is missing" : null),
  },
  {
    id: "value",
    kind: "text",
    header: "assay",
    label: "assay",
    width: "7em",
    get: (h) => h.value.text,
    set: (h, text) => ({ ...h, value: { ...h.value, text } }),
    problem: (h) => refusalOf(h.value, "solidAssay"),
  },
  {
    id: "unit",
    kind: "choice",
    header: "unit",
    label: "unit",
    width: "5.5em",
    options: units,
    get: (h) => h.value.unit,
    set: (h, unit) => ({ ...h, value: { ...h.value, unit } }),
  },
  {
    id: "laboratory",
    kind: "text",
    header: "laboratory",
    label: "laboratory",
    width: "20em",
    words: true,
    usual: [...new Set(rows.map((h) => h.laboratory).filter(Boolean))],
    get: (h) => h.laboratory,
    set: (h, laboratory) => ({ ...h, laboratory }),
  },
  {
    id: "method",
    kind: "text",
    header: "method",
    label: "method",
    width: "13em",
    words: true,
    usual: [...new Set(rows.map((h) => h.method).filter(Boolean))],
    get: (h) => h.method,
    set: (h, method) => ({ ...h, method }),
  },
  {
    id: "head",
    kind: "check",
    header: "the head",
    label: "the head of its element",
    width: "6em",
    get: (h) => h.head,
    set: (h, head) => ({ ...h, head }),
  },
];

/** All head assays as they came, and which one accounts use. */
export function HeadAssays({
  heads,
  onChange,
  readOnly,
}: {
  heads: HeadAssay[];
  onChange: (heads: HeadAssay[]) => void;
  readOnly: boolean;
}) {
  const marked = (next: HeadAssay[]) => {
    const newly = next.findIndex((h, i) => h.head && !heads[i]?.head);
    onChange(newly < 0 ? next : markHead(next, newly, true));
  };
  return (
    <>
      <EntryGrid
        caption="Head assays"
        rowName="assay"
        rows={heads}
        columns={columns(heads)}
        blank={blank}
        onChange={marked}
        readOnly={readOnly}
        emptyText="No head assay yet."
      />
      <ul className="mt-2 text-sm">
        {headsOf(heads).map(({ element, head, remark, open }) => (
          <li key={element} className={open ? "text-signal" : "text-muted"}>
            <b className="text-ink">{element}</b>{" "}
            {head && (
              <>
                accounts use {head.value.text.trim() === "" ? "an empty assay" : head.value.text}{" "}
                {unitText(head.value.unit)}
                {head.laboratory !== "" && `, ${head.laboratory}`}
                {remark !== null && "; "}
              </>
            )}
            {remark}
          </li>
        ))}
      </ul>
    </>
  );
}
