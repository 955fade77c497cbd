import { reagentById } from "../../../shared/reach/reagents";
import { z } from "../../../shared/schemas/z";
import { windowSheetQuery } from "../../../shared/schemas/plan";
import type { Deps } from "../../deps";
import { file } from "../../http/answer";
import { Refusal } from "../../http/refusal";
import { lettingOthers } from "../../http/lettingOthers";
import { route } from "../../http/route";
import { revisionOf, storedPlan } from "../plans/rows";
import { windowSheet } from "./page";
import { probeScale, workInTurns } from "./work";

const fileName = (name: string): string =>
  name
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, "-")
    .replace(/^-|-$/g, "") || "plan";

export const windowSheetRoutes = ({ db, chemistry }: Deps) => [
  route({
    method: "GET",
    path: "/api/plans/:id/revisions/:number/window-sheet.pdf",
    roles: "signed-in",
    params: z.object({ id: z.string().min(1), number: z.coerce.number().int().min(1) }),
    query: windowSheetQuery,
    handle: async ({ params, query }) => {
      const plan = storedPlan(db, params.id);
      const revision = revisionOf(db, params.id, params.number);
      const library = chemistry.libraryOf(revision.dataVersion);
      if (!library.ok) throw Refusal.from(library.error);
      const data = library.value;
      const probe = probeScale(data, query.electrode, query.electrodeC ?? revision.inputs.temperatureC);
      if (query.electrode !== undefined && probe === null) {
        const message = `The library has no electrode ${query.electrode} at ${query.electrodeC ?? revision.inputs.temperatureC} C.`;
        throw new Refusal("INVALID_INPUT", "electrode", message);
      }
      const unknown = query.reach?.find((id) => !reagentById.has(id));
      if (unknown !== undefined)
        throw new Refusal("INVALID_INPUT", "reach", `No oxidant, reductant or cementing metal is called "${unknown}".`);
      const asked = workInTurns(plan, revision, data, {
        probe,
        window: query.window,
        gases: query.gases,
        reach: query.reach,
      });
      const work = await lettingOthers(asked);
      if (!work.ok) throw Refusal.from(work.error);
      return file(await windowSheet(work.value), {
        "Content-Type": "application/pdf",
        "Content-Disposition": `inline; filename="${fileName(plan.name)}-window-sheet-revision-${revision.number}.pdf"`,
        "Cache-Control": "no-store",
      });
    },
  }),
];
