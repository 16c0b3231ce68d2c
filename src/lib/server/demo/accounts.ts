import type { Role } from "#lib/policy/index.ts";

/** Known to everyone who reads this, so they exist in demo mode alone. */
export const demoPassword = "clatter-demo-1";

export const demoTeam = { name: "Quillfeather Electronics", slug: "quillfeather-electronics" };

export const demoPeople: readonly { role: Role; email: string; name: string }[] = [
  { role: "owner", email: "owner@demo.test", name: "Oda Quillfeather" },
  { role: "designer", email: "designer@demo.test", name: "Dario Westerby" },
  { role: "reviewer", email: "reviewer@demo.test", name: "Reni Okparavo" },
  { role: "builder", email: "builder@demo.test", name: "Bram Tolliver" },
  { role: "viewer", email: "viewer@demo.test", name: "Vida Lindqvast" },
];
