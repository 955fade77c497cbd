import { readFileSync } from "node:fs";
import tailwindcss from "@tailwindcss/vite";
import react from "@vitejs/plugin-react";
import { loadEnv, type Plugin } from "vite";
import { compression } from "vite-plugin-compression2";
import { defineConfig } from "vitest/config";

/** Where `npm run dev` finds the server: the environment, else .env, else the server's own default. */
const apiPort = loadEnv("development", import.meta.dirname, "PORT").PORT ?? "5180";

/** What zod brings and no page asks for, about 7 kB compressed on the first load: the writers of JSON Schema, and its own words of
 *  complaint (shared/schemas/z.ts has all of ours). */
const withoutUnusedZod: Plugin = {
  name: "without-unused-zod",
  apply: "build",
  load(id) {
    if (/zod[\\/]v4[\\/]locales[\\/]en\.js$/.test(id)) return "export default () => ({});";
    if (!/zod[\\/]v4[\\/]core[\\/](to-json-schema|json-schema-processors)\.js$/.test(id)) return null;
    const names = readFileSync(id, "utf8").matchAll(/^export (?:const|function) (\w+)/gm);
    const stubs = Array.from(names, ([, name]) => `export const ${name} = () => undefined;`);
    return [...stubs, "export const process = () => undefined;"].join("\n");
  },
};

/** Files that the entry itself brings. */
const fromTheFirst =
  /\/(rolldown-runtime|react|queries|z|leaves|chunk|controls|preload-helper|formula|coerce|view|solver|parts)-/;

/** Modules of src/lib and src/components that nearly every page is made of. */
const parts = [
  "api|chemistry|classes|failure|format|glossaryTitles|metals|pages|planWords|plans|potential|queries|scaleChoice|title|units|useRested",
  "preferences|session|Button|Caution|ComponentName|FieldFrame|Formula|FormulaText|Help|MetalLine|NumberField|Quantity|Select|Slider|TextField",
  "choice|status|text|useLate|whenOpened",
];

export default defineConfig({
  plugins: [
    react(),
    tailwindcss(),
    withoutUnusedZod,
    // The server sends the .br and .gz files that are made here.
    compression({ algorithms: ["gzip", "brotliCompress"], include: /\.(html|css|js|svg|json|ttf)$/ }),
  ],
  build: {
    outDir: "dist/client",
    emptyOutDir: true,
    // A part that comes late names the files it needs, to have them fetched at once; those that the page has from the first need no naming,
    // and the names were 3 kB compressed of the first load.
    modulePreload: {
      resolveDependencies: (_file, deps, { hostType }) =>
        hostType === "html" ? deps : deps.filter((dep) => !fromTheFirst.test(dep)),
    },
    rolldownOptions: {
      output: {
        codeSplitting: {
          groups: [
            // A group takes what its modules import along with it: without a place of its own React would go with Plotly,
            // and every page would fetch both.
            { name: "react", test: /node_modules[\\/](react|react-dom|scheduler)[\\/]/, priority: 2 },
            // The app loads Plotly with import(); named so that the size check and the browser tests can point at it.
            { name: "plotly", test: /node_modules[\\/](plotly\.js|react-plotly\.js)/, priority: 1 },
            // What only the map needs comes in one piece; Plotly follows when the map stands.
            {
              name: "map",
              test: /src[\\/]map[\\/](geometry[\\/]|names[\\/]|svg[\\/]|traces[\\/]|(boxes|content|cursor|figure|handle|LimitHover|Over|speciesText|texts|paintTrials|Touch|TrialsLayer|Under|WindowMap)\.)|shared[\\/]drawing[\\/](boundaries|labels|lit)\./,
              includeDependenciesRecursively: false,
              priority: 1,
            },
            // What nearly every page is made of: one file compresses better than twenty small ones.
            {
              name: "parts",
              test: new RegExp(`src[\\\\/](lib|components)[\\\\/](${parts.join("|")})\\.|shared[\\\\/]words[\\\\/]`),
              includeDependenciesRecursively: false,
              priority: 1,
            },
            // Small modules of the core that ask for none of it: solver and parts both build on them.
            {
              name: "leaves",
              test: /shared[\\/](constants|units|species[\\/](inProse|parts|sulfur|typeset)|hazards[\\/](gases|words)|schemas[\\/](chemistry|member|problem))\./,
              includeDependenciesRecursively: false,
              priority: 1,
            },
            // What every opened plan needs and other pages share, in two pieces by what they are about.
            {
              name: "tried",
              test: /shared[\\/](entry[\\/](interval|measure|quantities|readEntry)|metallurgy[\\/](dissolvedMetal|molarMass|account[\\/](liquor|words))|plan[\\/]totals|trials[\\/](comparable|judge|ligandTotal|spread|tally))\.|src[\\/]lib[\\/](judgedTrials|tallyWords|trials)\./,
              includeDependenciesRecursively: false,
              priority: 1,
            },
            {
              name: "asked",
              test: /shared[\\/](activity[\\/]freeAcid|drawing[\\/]hatches|hazards[\\/]presetCautions|practice[\\/]box|reach[\\/]reach|schemas[\\/](circuit|plan))\.|src[\\/](components[\\/](AcidAmount|SourceLink)|lib[\\/](presetLigands|sources)|map[\\/](cursorStore|metalStyle|trialMarks|trialStore|trust|typeSize|useSize|zoom))\.|workspace[\\/](answers[\\/]Reaction|asks[\\/]context|model[\\/]edit)\./,
              includeDependenciesRecursively: false,
              priority: 1,
            },
            // Sliders and rows of choices, the controls a page shows at once. Menus, lists, popovers and dialogs come when they are opened,
            // and bring what they need.
            {
              name: "controls",
              test: /@radix-ui[\\/](primitive|react-(primitive|context|compose-refs|slot|collection|direction|id|roving-focus|presence|slider|toggle|toggle-group|tabs|use-[a-z-]+))[\\/]/,
              priority: 1,
            },
            // The solver and what it says: asked for together wherever a plan is solved, on the page and in its worker.
            {
              name: "solver",
              test: /node_modules[\\/]robust-predicates|shared[\\/](analysis|solve|warnings|fields[\\/]|geometry[\\/]|gibbs[\\/]|hazards[\\/](?!gases|words|presetCautions)|planes[\\/]|selection[\\/]|setpoint[\\/]|windows[\\/]|reach[\\/](reagents|oxidants|reductants|liquors|verdict|equilibrium)|plan[\\/]toProblem|activity[\\/](davies|debyeHuckel)|species[\\/](library|checkSpecies|reaction|tables)\.|reactions[\\/](atTemperature|balance|wholeNumbers|redoxReagents|elements|names))/,
              includeDependenciesRecursively: false,
              priority: 1,
            },
            { name: "queries", test: /node_modules[\\/]@tanstack[\\/](query-core|react-query)[\\/]/, priority: 1 },
          ],
        },
      },
    },
    chunkSizeWarningLimit: 1600,
  },
  server: { proxy: { "/api": `http://127.0.0.1:${apiPort}` } },
  test: {
    projects: [
      // A timeout ends what hangs, and is no word on speed: beside other work a test may take ten times as long.
      {
        extends: true,
        test: {
          name: "core",
          environment: "node",
          include: ["tests/{core,golden,properties,cases}/**/*.test.ts"],
          testTimeout: 120_000,
          // Pure functions: nothing to keep apart.
          isolate: false,
        },
      },
      {
        extends: true,
        test: {
          name: "server",
          environment: "node",
          include: ["tests/server/**/*.test.ts"],
          testTimeout: 120_000,
          hookTimeout: 60_000,
          // Every test has an application and a database of its own; the modules may be loaded once a worker.
          isolate: false,
        },
      },
      {
        extends: true,
        test: {
          name: "client",
          environment: "jsdom",
          include: ["tests/client/**/*.test.{ts,tsx}"],
          setupFiles: ["tests/client/setup.ts"],
          testTimeout: 60_000,
          // Modules and the browser that is none are made once a worker; what a test drew, or kept there, is gone after it.
          isolate: false,
        },
      },
      {
        extends: true,
        test: {
          name: "e2e",
          environment: "node",
          include: ["tests/e2e/**/*.test.ts"],
          globalSetup: ["tests/support/builtApp.ts"],
          // Two files at a time, each with an application of its own: one waits for its screen while the other is drawn.
          maxWorkers: 2,
          // What the tests compare with, solver and chemistry, is loaded once a worker.
          isolate: false,
          testTimeout: 240_000,
          hookTimeout: 60_000,
          // A screen follows at once where nothing else runs; beside other work it may take a while.
          expect: { poll: { timeout: 15_000 } },
        },
      },
    ],
  },
});
