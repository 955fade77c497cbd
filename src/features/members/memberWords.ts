import type { InvitationRow } from "../../../shared/schemas/invitation";
import { memberRoles, type MemberRole } from "../../../shared/schemas/member";

/** What each role may do, for whoever gives it. */
export const roleNote: Readonly<Record<MemberRole, string>> = {
  admin: "all that a metallurgist may, and members and settings",
  metallurgist: "plans, chemistry, feeds, campaigns; approves trials",
  technician: "plans and records trials at the bench",
  manager: "reads everything, releases, sees costs",
};

export const roleOptions = memberRoles.map((value) => ({ value, label: value, note: roleNote[value] }));

export const invitationState: Readonly<Record<InvitationRow["state"], string>> = {
  open: "open",
  accepted: "accepted",
  withdrawn: "withdrawn",
  expired: "expired",
};

/** What became of the letter of an invitation. */
export function letterWords({ mail }: Pick<InvitationRow, "mail">): string {
  if (mail === null) return "no letter";
  if (mail.state === "sent") return "sent";
  if (mail.state === "kept") return "kept here, to be read in the mailbox";
  return `not sent: ${mail.error ?? "the mail server refused it"}`;
}
