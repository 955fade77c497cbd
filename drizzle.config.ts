import { defineConfig } from "drizzle-kit";

export default defineConfig({
  dialect: "sqlite",
  schema: "./server/features/*/schema.ts",
  out: "./drizzle",
});
