/// <reference types="astro/client" />

declare namespace App {
  interface Locals {
    actor: {
      userId: string;
      name: string;
      email: string;
      team: { id: string; name: string; slug: string } | null;
      role: "owner" | "designer" | "reviewer" | "builder" | "viewer" | null;
    } | null;
  }
}
