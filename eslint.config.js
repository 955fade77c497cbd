import reactHooks from "eslint-plugin-react-hooks";
import tseslint from "typescript-eslint";

/** Imports run one way: a file under `folder` may not name a module matching `regex`. */
const forbid = (folder, regex, message) => ({
  files: [`${folder}/**/*.{ts,tsx}`],
  rules: { "no-restricted-imports": ["error", { patterns: [{ regex, message }] }] },
});

export default tseslint.config(
  { ignores: ["dist/", "data/", "coverage/", "node_modules/", "test-results/", "drizzle/"] },
  tseslint.configs.recommendedTypeChecked,
  {
    languageOptions: { parserOptions: { project: "./tsconfig.json", tsconfigRootDir: import.meta.dirname } },
    rules: {
      "@typescript-eslint/consistent-type-imports": "error",
      "@typescript-eslint/no-explicit-any": "error",
      "@typescript-eslint/switch-exhaustiveness-check": ["error", { considerDefaultExhaustiveForUnions: true }],
      "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_" }],
      "@typescript-eslint/restrict-template-expressions": ["error", { allowNumber: true, allowBoolean: true }],
      eqeqeq: "error",
      "no-console": "error",
    },
  },
  { files: ["src/**/*.{ts,tsx}"], ...reactHooks.configs.flat["recommended-latest"] },
  { files: ["server/tools/**", "tests/bench/**", "tests/tools/**"], rules: { "no-console": "off" } },
  // A response's body is `any` there, and goes straight into expect().
  { files: ["tests/server/**", "tests/support/**"], rules: { "@typescript-eslint/no-unsafe-assignment": "off" } },
  { files: ["**/*.{js,mjs,cjs}"], ...tseslint.configs.disableTypeChecked },
  forbid(
    "shared",
    "^node:|/(src|server)/|^(react|express|drizzle-orm|better-sqlite3|plotly)",
    "shared/ is pure: numbers and text in, values out",
  ),
  forbid("src", "^node:|/server/", "src/ reaches the server through the API and shared/schemas"),
  {
    files: ["{shared,src,server}/**/*.{ts,tsx}"],
    ignores: ["shared/schemas/z.ts"],
    rules: {
      "@typescript-eslint/no-restricted-imports": [
        "error",
        {
          paths: [
            {
              name: "zod",
              allowTypeImports: true,
              message: "take z from shared/schemas/z: it complains in plain words",
            },
          ],
        },
      ],
    },
  },
  forbid("server", "/src/|^react", "server/ knows shared/, never the client"),
);
