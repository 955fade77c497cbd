const fields: Readonly<Record<string, string>> = {
  name: "name",
  description: "what it is",
  heads: "head assays",
  minerals: "minerals",
  carbonate: "gangue carbonate",
  moisture: "moisture",
  p80: "P80",
  solidDensity: "density of the solids",
  deletedAt: "deleted",
  element: "element",
  value: "assay",
  method: "method",
  laboratory: "laboratory",
  head: "the head",
  mineral: "mineral",
  share: "share of the metal",
};

/** "heads.2.value" → "head assay 3, assay" */
export function feedWords(path: string): string {
  const [list = "", index, ...rest] = path.split(".");
  if (index === undefined || !/^\d+$/.test(index)) return fields[list] ?? list;
  const row = `${list === "heads" ? "head assay" : "mineral"} ${Number(index) + 1}`;
  const field = rest.find((part) => part !== "text" && part !== "unit");
  return field === undefined ? row : `${row}, ${fields[field] ?? field}`;
}
