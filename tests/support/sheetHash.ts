// Prints the SHA-256 of one window sheet: run in a process of its own, so that a test can compare.
import { createHash } from "node:crypto";
import { readTables } from "../../server/chemistry/readTables";
import { windowSheet } from "../../server/features/windowSheet/page";
import { workOf } from "../../server/features/windowSheet/work";
import { valueOf } from "../../shared/outcome";
import { libraryFrom } from "../../shared/species/library";
import { sheetPlan, sheetRevision } from "./sheetFixture";

const { tables } = readTables();
const work = workOf(sheetPlan, sheetRevision(tables.version), valueOf(libraryFrom(tables)));
if (!work.ok) throw new Error(work.error.message);
void windowSheet(work.value).then((bytes) => process.stdout.write(createHash("sha256").update(bytes).digest("hex")));
