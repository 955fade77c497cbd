const words: Readonly<Record<string, string>> = {
  feedId: "feed",
  code: "code",
  kind: "kind",
  stage: "stage",
  status: "status",
  statusReason: "reason",
  operator: "operator",
  startedAt: "start",
  endedAt: "end",
  replicateOf: "repeats",
  notes: "notes",
  deletedAt: "deleted",
  planned: "planned",
  measured: "measured",
  charge: "charge",
  products: "products",
  temperature: "temperature",
  pH: "pH",
  orp: "ORP",
  freeAcid: "free acid",
  tenor: "tenor",
  cementingMetal: "cementing metal",
  solids: "solids in the pulp",
  p80: "P80",
  duration: "duration",
  at: "time",
  electrode: "electrode",
  electrodeTemperature: "electrode temperature",
  cooledSample: "cooled sample",
  note: "note",
  role: "role",
  reagent: "reagent",
  amount: "amount",
  strength: "strength",
  density: "density",
  reason: "reason",
  metal: "metal",
  dosed: "dosed",
  active: "active metal",
  unreacted: "unreacted",
  component: "ligand",
  wetMass: "wet mass",
  moisture: "moisture",
  dryMass: "dry mass",
  liquorVolume: "liquor volume",
  liquorDensity: "liquor density",
  liquorAssays: "starting liquor",
  volume: "volume",
  makeUpVolume: "make-up volume",
  makeUpAssays: "make-up",
  drySolids: "dry solids",
  solidsAssays: "solids",
  vesselVolume: "liquor in the vessel",
  filtrateVolume: "filtrate volume",
  finalAssays: "final liquor",
  washVolume: "wash volume",
  washAssays: "wash",
  residueDryMass: "dry mass of the solids",
  residueAssays: "solids",
  analyte: "analyte",
  assays: "assay",
  method: "method",
};

const rowNames: Readonly<Record<string, string>> = {
  readings: "reading",
  doses: "dose",
  ligands: "ligand",
  samples: "sample",
  assays: "assay",
  liquorAssays: "starting liquor, assay",
  makeUpAssays: "make-up, assay",
  finalAssays: "final liquor, assay",
  washAssays: "wash, assay",
  residueAssays: "solids, assay",
  solidsAssays: "solids, assay",
};

/** A field of a trial as people call it: "measured.readings.2.pH.value" → "reading 3, pH", "planned.pH" → "planned pH". */
export function trialWords(path: string): string {
  const parts = path.split(".").filter((part) => part !== "value" && part !== "text" && part !== "unit");
  const said: string[] = [];
  for (let i = 0; i < parts.length; i += 1) {
    const part = parts[i] ?? "";
    const next = parts[i + 1];
    if (part === "measured" && next !== undefined) continue;
    if (next !== undefined && /^\d+$/.test(next)) {
      said.push(`${rowNames[part] ?? words[part] ?? part} ${Number(next) + 1}`);
      i += 1;
    } else if (part === "planned" && next !== undefined) said.push("planned");
    else said.push(rowNames[part] && next !== undefined ? `${words[part] ?? part} ${next}` : (words[part] ?? part));
    if (rowNames[part] && next !== undefined && !/^\d+$/.test(next)) i += 1;
  }
  return said.join(", ").replace(/^planned, /, "planned ");
}

/** Where on the page a field is entered: id of its section. */
export function sectionOf(path: string): string {
  const [part = "", second = ""] = path.split(".");
  if (part === "planned") return "planned";
  if (part === "charge") return second === "liquorAssays" ? "solutions" : "charge";
  if (part === "measured") return second === "readings" ? "readings" : "reagents";
  if (part === "samples") return /assays/i.test(path) ? "solutions" : "samples";
  if (part === "products") {
    if (second === "residueAssays") return "solids";
    return /Assays$/.test(second) ? "solutions" : "products";
  }
  return part === "feed" ? "feed" : "trial";
}
