import { z } from "./z";

export const memberRoles = ["admin", "metallurgist", "technician", "manager"] as const;
export type MemberRole = (typeof memberRoles)[number];

export const signIn = z.object({ email: z.email(), password: z.string().min(1).max(200) });
export const firstAdmin = z.object({
  email: z.email(),
  name: z.string().trim().min(1).max(100),
  password: z.string().min(12, "Too short: at least 12 characters").max(200, "Too long: at most 200 characters"),
});
/** Remembered per user; the client merges its defaults under it. */
export const preferences = z.object({
  theme: z.enum(["system", "light", "dark"]).optional(),
  /** all-fields view of the map instead of shut and open ground */
  plainMap: z.boolean().optional(),
  potentialUnit: z.enum(["V", "mV"]).optional(),
  /** "SHE" or a reference electrode series of electrodes.csv, for example "AGCL-3M" */
  potentialScale: z.string().max(40).optional(),
  electrodeTemperatureC: z.number().min(0).max(100).nullable().optional(),
  layers: z.record(z.string(), z.boolean()).optional(),
});
export type Preferences = z.infer<typeof preferences>;
export interface Member {
  id: string;
  email: string;
  name: string;
  role: MemberRole;
}
/** Accounts of the invented site, for the sign-in page. */
export interface DemoAccounts {
  accounts: { email: string; role: MemberRole }[];
  password: string;
}
/** GET /api/session */
export interface SessionAnswer {
  user: Member | null;
  /** true while the database has no user: the client shows the first-admin page */
  needsFirstAdmin: boolean;
  /** to those signed out, while the demo's accounts are there */
  demo?: DemoAccounts;
}
/** Every refusal: status code plus this body. */
export interface ApiError {
  error: { code: string; path: string; message: string };
}
