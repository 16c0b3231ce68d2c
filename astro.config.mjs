import node from "@astrojs/node";
import react from "@astrojs/react";
import tailwindcss from "@tailwindcss/vite";
import { defineConfig } from "astro/config";
import { leaveOut } from "./src/run/leaveOut.mjs";

export default defineConfig({
  output: "server",
  outDir: process.env.OUT_DIR || "dist",
  adapter: node({ mode: "middleware" }),
  integrations: [react()],
  server: { host: "127.0.0.1" },
  security: {
    // Both are the business of src/run/http: it checks the origin of every kind of write, not of form posts alone, and
    // lets no Host or X-Forwarded header through that it does not vouch for.
    checkOrigin: false,
    allowedDomains: [{}],
  },
  experimental: {
    // Hashes of Astro's own inline scripts and styles; src/lib/server/headers.ts adds what is not about them.
    csp: {
      algorithm: "SHA-256",
      directives: [
        "default-src 'self'",
        "img-src 'self' data: blob:",
        "font-src 'self'",
        "connect-src 'self'",
        "worker-src 'self' blob:",
      ],
    },
  },
  vite: {
    plugins: [tailwindcss(), leaveOut()],
    // A worker fetches the one kind it is asked about, which only modules can.
    worker: { format: "es", plugins: () => [leaveOut()] },
  },
});
