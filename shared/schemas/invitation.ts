import { z } from "./z";
import { pageQuery } from "./api";
import { firstAdmin, memberRoles, type Member, type MemberRole } from "./member";
import { reason } from "./history";

export const memberUpdate = z.object({
  name: z.string().trim().min(1).max(100).optional(),
  role: z.enum(memberRoles).optional(),
  /** a disabled member is signed out everywhere and cannot sign in */
  disabled: z.boolean().optional(),
  reason,
});

/** A member as administrators see one. */
export interface MemberRow extends Member {
  disabled: boolean;
  version: number;
  createdAt: string; // ISO 8601
}

export const invitationCreate = z.object({
  email: z.email().max(200),
  role: z.enum(memberRoles),
  /** a line of the inviter's own in the letter */
  message: z.string().trim().max(500).default(""),
});

export const invitationStates = ["open", "accepted", "withdrawn", "expired"] as const;
export const invitationsQuery = pageQuery.extend({ state: z.enum([...invitationStates, "all"]).default("all") });

export interface InvitationRow {
  id: string;
  email: string;
  role: MemberRole;
  invitedBy: string;
  createdAt: string; // ISO 8601
  expiresAt: string;
  state: (typeof invitationStates)[number];
  /** the letter: waiting in the mailbox page, handed to the mail server, or refused by it */
  mail: { id: string; state: MailState; error: string | null } | null;
}

/** What the page behind the link shows before anything is typed. */
export interface InvitationOffer {
  email: string;
  role: MemberRole;
  invitedBy: string;
  expiresAt: string;
}

export const invitationAccept = firstAdmin.omit({ email: true });

export type MailState = "kept" | "sent" | "failed";

/** A letter of this server. Links in it are shown while they still open something, then blotted out. */
export interface MailRow {
  id: string;
  to: string;
  subject: string;
  text: string;
  createdAt: string; // ISO 8601
  /** kept: no mail server is set up, the letter is read here */
  state: MailState;
  sentAt: string | null;
  error: string | null;
}
