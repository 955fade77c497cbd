import type { Agent } from "supertest";
import { windowSheet } from "../../server/features/windowSheet/page";
import { workOf } from "../../server/features/windowSheet/work";
import { valueOf } from "../../shared/outcome";
import type { ProjectRow } from "../../shared/schemas/api";
import { toProblem } from "../../shared/plan/toProblem";
import type { PlanInputs, PlanRow } from "../../shared/schemas/plan";
import type { Point } from "../../shared/solution";
import { solve } from "../../shared/solve";
import { readPdf, type PdfText, type ReadPdf } from "./pdf";
import { sheetInputs, sheetPlan, sheetRevision } from "./sheetFixture";
import { library, tables } from "./testServer";

export async function planOf(client: Agent, inputs: PlanInputs = sheetInputs, name = "Third tank"): Promise<PlanRow> {
  const site = { siteName: "North works", name: "Second stage" };
  const project = (await client.post("/api/projects").send(site).expect(201)).body as ProjectRow;
  const values = { projectId: project.id, name, description: "", inputs };
  return (await client.post("/api/plans").send(values).expect(201)).body as PlanRow;
}

export const bytesOf = async (client: Agent, path: string): Promise<Buffer> => {
  const answer = await client.get(path).buffer(true).expect(200).expect("Content-Type", "application/pdf");
  return answer.body as Buffer;
};

/** A sheet of inputs, drawn without a server. */
export async function drawn(
  inputs: PlanInputs,
  plan = sheetPlan,
  note = "Peroxide in place of air.",
): Promise<ReadPdf> {
  const work = valueOf(workOf(plan, { ...sheetRevision(tables.version, inputs), note }, library));
  return readPdf(await windowSheet(work));
}

const boxOf = ({ x, y, width, size }: PdfText) => ({ x0: x, x1: x + width, y0: y - 0.68 * size, y1: y + 0.12 * size });

/** Pieces of text that cover each other, or hang over the edge of the page. */
export function collisions({ texts }: ReadPdf): string[] {
  const level = texts.filter((t) => !t.turned && !t.halo && t.text.trim() !== "");
  const found = level
    .filter((t) => t.x < 14 || t.x + t.width > 581 || t.y < 14 || t.y > 828)
    .map((t) => `over the edge: ${t.text}`);
  level.forEach((a, i) => {
    const p = boxOf(a);
    for (const b of level.slice(i + 1)) {
      const q = boxOf(b);
      const wide = Math.min(p.x1, q.x1) - Math.max(p.x0, q.x0);
      const high = Math.min(p.y1, q.y1) - Math.max(p.y0, q.y0);
      if (wide > 0.4 && high > 0.4) found.push(`${a.text} | ${b.text}`);
    }
  });
  return found;
}

/** The plan solved as its sheet draws it. */
export const solved = (inputs: PlanInputs) => valueOf(solve(toProblem(inputs, library), library, { shutGround: true }));

/** Whether a closed path of the page has the shape of a ring in (pH, Eh), whatever the scales. */
export const outlineDrawn = ({ paths }: ReadPdf, ring: readonly Point[]): boolean => {
  const [xs, ys] = [ring.map((p) => p[0]), ring.map((p) => -p[1])];
  const size = (v: readonly number[]) => Math.max(...v) - Math.min(...v);
  const want = ring.map(([x, y]) => [(x - Math.min(...xs)) / size(xs), (-y - Math.min(...ys)) / size(ys)] as const);
  return paths.some((path) => {
    if (path.length !== ring.length) return false;
    const [px, py] = [path.map((p) => p[0]), path.map((p) => p[1])];
    return path.every(([x, y], i) => {
      const [u, v] = [(x - Math.min(...px)) / size(px), (y - Math.min(...py)) / size(py)];
      return Math.hypot(u - want[i]![0], v - want[i]![1]) < 1e-3;
    });
  });
};
