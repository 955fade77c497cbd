import type { MemberRole } from "../../shared/schemas/member";

/** One account a role at an invented site. The password stands in the README: never keep real work beside it. */
export const demoPassword = "Gangueway-demo-1";

export const demoAccounts: { id: string; email: string; name: string; role: MemberRole }[] = [
  { id: "demo-admin", email: "admin@tarnhollow.example", name: "Administrator (invented)", role: "admin" },
  {
    id: "demo-metallurgist",
    email: "metallurgist@tarnhollow.example",
    name: "Metallurgist (invented)",
    role: "metallurgist",
  },
  { id: "demo-technician", email: "technician@tarnhollow.example", name: "Technician (invented)", role: "technician" },
  { id: "demo-manager", email: "manager@tarnhollow.example", name: "Manager (invented)", role: "manager" },
];
