import type { Db } from "../db/open";
import { planRevisions, plans, projects, users } from "../db/schema";
import { hashPassword } from "../features/auth/passwords";
import type { Chemistry } from "../features/chemistry/library";
import { anyMember } from "../features/members/service";
import { demoAccounts, demoPassword } from "./accounts";
import { demoPlans, demoProjects, demoSite } from "./plans";
import { seedDemoRecords } from "./records";

/** Writes the demo's rows, each under its own fixed id; a row that is there, whoever changed it since, stays as it is. */
export async function seedDemo(db: Db, chemistry: Chemistry): Promise<void> {
  const dataVersion = chemistry.current.version;
  const createdAt = "2026-08-31T07:00:00.000Z";
  const passwordHash = await hashPassword(demoPassword);
  const people = demoAccounts.map((person) => ({ ...person, passwordHash, preferences: {}, createdAt }));
  db.transaction((tx) => {
    tx.insert(users).values(people).onConflictDoNothing().run();
    for (const { id, name } of demoProjects) {
      const project = { id, name, siteName: demoSite, invented: true, createdAt };
      tx.insert(projects).values(project).onConflictDoNothing().run();
    }
    for (const { id, project, name, description, revisions } of demoPlans) {
      const [first, last] = [revisions[0], revisions.at(-1)];
      if (!first || !last) continue;
      const plan = { id, projectId: project, name, description, invented: true };
      const written = tx
        .insert(plans)
        .values({ ...plan, version: revisions.length, createdAt: first.at, updatedAt: last.at })
        .onConflictDoNothing()
        .run();
      if (written.changes === 0) continue;
      revisions.forEach(({ note, at, inputs }, index) => {
        const frozen = { note, inputs, createdAt: at, dataVersion };
        tx.insert(planRevisions)
          .values({ planId: id, number: index + 1, authorId: "demo-metallurgist", ...frozen })
          .run();
      });
    }
    seedDemoRecords(tx, chemistry);
  });
}

/** The demo belongs into an empty database only: beside real members its known passwords would be a hole.
 *  @returns whether it was written */
export async function seedDemoOnFirstRun(db: Db, chemistry: Chemistry): Promise<boolean> {
  if (anyMember(db)) return false;
  await seedDemo(db, chemistry);
  return true;
}
