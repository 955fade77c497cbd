import { eq, inArray } from "drizzle-orm";
import type { Db } from "../db/open";
import { planRevisions, plans, projects, users } from "../db/schema";
import { hashPassword } from "../features/auth/passwords";
import type { Chemistry } from "../features/chemistry/library";
import { anyMember } from "../features/members/service";
import { demoAccounts, demoPassword } from "./accounts";
import { demoPlans, demoProjects, demoSite } from "./plans";
import { seedDemoRecords } from "./records";

const createdAt = "2026-08-31T07:00:00.000Z";

/** Plans with their projects, and what was tried on them: each row under its own fixed id; one that is there, whoever changed it since,
 *  stays as it is. */
function seedScenario(db: Db, chemistry: Chemistry): number {
  const dataVersion = chemistry.current.version;
  let added = 0;
  for (const { id, name } of demoProjects) {
    const project = { id, name, siteName: demoSite, invented: true, createdAt };
    added += db.insert(projects).values(project).onConflictDoNothing().run().changes;
  }
  for (const { id, project, name, description, revisions } of demoPlans) {
    const [first, last] = [revisions[0], revisions.at(-1)];
    if (!first || !last) continue;
    const plan = { id, projectId: project, name, description, invented: true };
    const written = db
      .insert(plans)
      .values({ ...plan, version: revisions.length, createdAt: first.at, updatedAt: last.at })
      .onConflictDoNothing()
      .run();
    if (written.changes === 0) continue;
    added += 1;
    revisions.forEach(({ note, at, inputs }, index) => {
      const frozen = { note, inputs, createdAt: at, dataVersion };
      db.insert(planRevisions)
        .values({ planId: id, number: index + 1, authorId: "demo-metallurgist", ...frozen })
        .run();
    });
  }
  return added + seedDemoRecords(db, chemistry);
}

/** Writes the demo's accounts and scenario; what is there stays as it is. */
export async function seedDemo(db: Db, chemistry: Chemistry): Promise<void> {
  const passwordHash = await hashPassword(demoPassword);
  const people = demoAccounts.map((person) => ({ ...person, passwordHash, preferences: {}, createdAt }));
  db.transaction((tx) => {
    tx.insert(users).values(people).onConflictDoNothing().run();
    seedScenario(tx, chemistry);
  });
}

/** Whether the demo was written here once: its projects and the people its rows name. */
function holdsDemo(db: Db): boolean {
  const scenario = db
    .select()
    .from(projects)
    .where(eq(projects.id, demoProjects[0]?.id ?? ""))
    .get();
  const people = db
    .select()
    .from(users)
    .where(
      inArray(
        users.id,
        demoAccounts.map(({ id }) => id),
      ),
    )
    .all();
  return scenario?.invented === true && people.length === demoAccounts.length;
}

/** At every start. An empty database gets the demo; one that holds an earlier demo gets what was invented since, in the demo's own
 *  projects; any other stays as it is, because beside real members the accounts' known passwords would be a hole. No account is ever
 *  written again.
 *  @returns how many rows of the scenario were written */
export async function seedDemoAtStart(db: Db, chemistry: Chemistry): Promise<"whole" | number> {
  if (!anyMember(db)) {
    await seedDemo(db, chemistry);
    return "whole";
  }
  return holdsDemo(db) ? db.transaction((tx) => seedScenario(tx, chemistry)) : 0;
}
