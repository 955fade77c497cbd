// Bundles the server into dist/server.mjs, beside the pages Vite built into dist/client; or into the file that is named.
import { build } from "esbuild";

await build({
  entryPoints: ["server/index.ts"],
  outfile: process.argv[2] ?? "dist/server.mjs",
  bundle: true,
  platform: "node",
  format: "esm",
  target: "node20",
  packages: "external",
  sourcemap: true,
  logLevel: "warning",
});
