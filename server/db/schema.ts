/** Every table of the database, on one page. */
export { sessions } from "../features/auth/schema";
export { campaigns } from "../features/campaigns/schema";
export { chemistryVersions, libraryRows, speciesRows } from "../features/chemistry/schema";
export { comments } from "../features/comments/schema";
export { feeds } from "../features/feeds/schema";
export { history } from "../features/history/schema";
export { mails } from "../features/mailbox/schema";
export { invitations, users } from "../features/members/schema";
export { planRevisions, plans } from "../features/plans/schema";
export { projects } from "../features/projects/schema";
export { speciesEdits } from "../features/speciesEdits/schema";
export { trialRecords, trials } from "../features/trials/schema";
