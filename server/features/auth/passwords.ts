import { hash, verify } from "@node-rs/argon2";

/** argon2id; twice the library's passes, about 15 ms here. */
const cost = { timeCost: 4 };

export const hashPassword = (password: string): Promise<string> => hash(password, cost);

const decoy = hashPassword("nobody has this password");

/** Takes as long for a member who does not exist (`hash` null) as for one who does. */
export async function passwordMatches(stored: string | null, password: string): Promise<boolean> {
  const matches = await verify(stored ?? (await decoy), password);
  return stored !== null && matches;
}
