import { existsSync, readdirSync } from "node:fs";
import astro from "eslint-plugin-astro";
import boundaries from "eslint-plugin-boundaries";
import accessibility from "eslint-plugin-jsx-a11y-x";
import hooks from "eslint-plugin-react-hooks";
import tseslint from "typescript-eslint";

// Who may import whom. DEVELOPERS.md tells the reasons; everything not listed here is refused.
const element = (type, pattern, extra = {}) => ({ type, pattern, partialMatch: false, ...extra });
const from = (...types) => ({ element: { types: { anyOf: types } } });
const may = (who, ...whom) => ({ from: from(...who), allow: { to: from(...whom) } });
const packages = (...source) => ({ to: { module: { origin: "external", ...(source.length > 0 ? { source } : {}) } } });

const elements = [
  // The first match wins: the narrow ones stand above the wide ones.
  element("kind", "src/lib/circuit/kinds/*", { capture: ["kind"] }),
  element("registry", "src/lib/circuit/kinds"),
  element("circuit", "src/lib/circuit"),
  element("policy", "src/lib/policy"),
  element("wire", "src/lib/wire"),
  element("db", "src/lib/db"),
  element("server", "src/lib/server"),
  element("client", "src/lib/client"),
  element("components", "src/components"),
  element("layouts", "src/layouts"),
  element("styles", "src/styles"),
  element("workers", "src/workers"),
  element("run", "src/run"),
  element("pages", "src/pages"),
  element("app", "src"), // middleware.ts, env.d.ts
];

const library = ["circuit", "registry"];
const shared = ["wire", "policy", ...library];
const directions = [
  may(["circuit"], "circuit"),
  may(["kind"], "circuit"),
  may(["registry"], "kind", "circuit"),
  may(["policy"], "policy"),
  may(["wire"], "wire", "policy", ...library),
  may(["db"], "db", "policy", "circuit"),
  may(["server"], "server", "db", ...shared),
  may(["run"], "run", "server", "db", ...shared),
  may(["client"], "client", "workers", ...shared),
  may(["components", "layouts"], "components", "layouts", "client", "styles", ...shared),
  may(["workers"], ...library),
  may(["app"], "server", ...shared),
  may(["pages"], "pages", "components", "layouts", "styles", "server", ...shared),
  { from: from("circuit", "kind", "registry", "workers"), allow: packages("mathjs", "fft.js", "pure-rand", "comlink") },
  { from: from("wire"), allow: packages("zod") },
  { from: from("db"), allow: packages("drizzle-orm", "drizzle-orm/*", "postgres") },
  { from: from("server", "run", "client", "components", "layouts", "pages", "app"), allow: packages() },
  { from: from("server", "run", "db"), allow: { to: { module: { origin: "core" } } } },
  { from: from("components", "layouts", "client"), disallow: packages("drizzle-orm", "drizzle-orm/*", "postgres") },
  // The browser half of the auth library is reached through lib/client alone.
  { from: from("components", "layouts"), disallow: packages("better-auth", "better-auth/*") },
];

const importDirections = (...more) => ({
  plugins: { boundaries },
  settings: {
    "import/resolver": { typescript: { alwaysTryTypes: true } },
    "boundaries/include": ["src/**/*"],
    "boundaries/elements": elements,
  },
  rules: {
    "boundaries/no-unknown-files": "error",
    "boundaries/no-unknown-dependencies": "error",
    "boundaries/dependencies": [
      "error",
      { default: "disallow", checkAllOrigins: true, policies: [...directions, ...more] },
    ],
  },
});

// A kind's name as a literal outside its folder is the beginning of a type switch spread over the tree.
const kindsFolder = new URL("src/lib/circuit/kinds/", import.meta.url);
const kindFolders = existsSync(kindsFolder) ? readdirSync(kindsFolder, { withFileTypes: true }) : [];
const kindIds = new Set(kindFolders.filter((entry) => entry.isDirectory()).map((entry) => entry.name));
const noKindLiterals = {
  meta: {
    type: "problem",
    schema: [],
    messages: { named: '"{{kind}}" is a stage kind: ask the registry instead of naming it.' },
  },
  create(context) {
    const report = (node, value) => {
      if (kindIds.has(value)) context.report({ node, messageId: "named", data: { kind: value } });
    };
    return {
      Literal: (node) => report(node, node.value),
      TemplateElement: (node) => report(node, node.value.cooked),
    };
  },
};

const impure = ["Date", "performance", "fetch", "window", "document", "crypto", "process", "setTimeout"];
const withParser = { languageOptions: { parser: tseslint.parser, parserOptions: { projectService: true } } };

export default [
  { ignores: ["dist/", ".clatterbench/", ".astro/", "node_modules/", "migrations/"] },
  { linterOptions: { reportUnusedDisableDirectives: "error" } },

  { files: ["src/**/*.{ts,tsx}", "tests/**/*.{ts,tsx}", "*.ts"], ...withParser },
  ...astro.configs["flat/base"],

  { files: ["src/**/*.{ts,tsx,astro}"], ...importDirections() },
  // The library's front door shows the registry to everyone else; the rest of the library is given its kinds.
  { files: ["src/lib/circuit/index.ts"], ...importDirections(may(["circuit"], "registry")) },
  {
    files: ["src/**/*.{ts,tsx,astro}"],
    ignores: ["src/lib/circuit/kinds/**"],
    plugins: { clatterbench: { rules: { "no-kind-literals": noKindLiterals } } },
    rules: { "clatterbench/no-kind-literals": "error" },
  },
  {
    files: ["src/lib/circuit/**/*.ts"],
    rules: {
      "no-restricted-globals": [
        "error",
        ...impure.map((name) => ({ name, message: "The library is pure: pass the value in." })),
      ],
      "no-restricted-properties": [
        "error",
        { object: "Math", property: "random", message: "Pass a seeded source of numbers in." },
      ],
    },
  },

  {
    files: ["**/*.{ts,tsx,astro,js,mjs}"],
    rules: { "max-lines": ["error", 300], eqeqeq: "error", "prefer-const": "error" },
  },
  { files: ["tests/**"], rules: { "max-lines": ["error", 500] } },
  {
    files: ["**/*.{ts,tsx}"],
    plugins: { "@typescript-eslint": tseslint.plugin },
    rules: {
      "@typescript-eslint/no-explicit-any": "error",
      "@typescript-eslint/no-floating-promises": "error",
      "@typescript-eslint/no-misused-promises": ["error", { checksVoidReturn: { attributes: false } }],
      "@typescript-eslint/await-thenable": "error",
      "@typescript-eslint/switch-exhaustiveness-check": ["error", { considerDefaultExhaustiveForUnions: true }],
      "@typescript-eslint/only-throw-error": "error",
      "@typescript-eslint/consistent-type-imports": ["error", { disallowTypeAnnotations: false }],
      "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_" }],
    },
  },
  { files: ["**/*.tsx"], ...hooks.configs.flat.recommended },
  { files: ["**/*.tsx"], ...accessibility.configs.recommended },
  // A question asked in place moves the focus to its safe answer; no page takes the focus as it loads.
  { files: ["**/*.tsx"], rules: { "jsx-a11y-x/no-autofocus": "off" } },
];
