import next from "eslint-config-next/core-web-vitals";
import typescript from "eslint-config-next/typescript";

const NO_REEXPORT = {
  selector: "ExportAllDeclaration",
  message: "Import the file itself: a barrel hides where a thing lives.",
};
const NO_DEFAULT_EXPORT = {
  selector: "ExportDefaultDeclaration",
  message: "Export by name: only files that Next reads by convention and tool configurations export a default.",
};
/** Files whose default export Next or a tool looks for. */
const DEFAULT_EXPORT_FILES = [
  "app/**/{page,layout,loading,error,not-found,forbidden,unauthorized,global-error,template,default}.tsx",
  "app/**/{icon,apple-icon,opengraph-image,manifest,robots,sitemap}.{ts,tsx}",
  "*.config.{ts,mjs}",
  "scripts/**/*.config.mjs",
  "tests/**/*.config.ts",
  "tests/**/global-setup.ts",
];

const lintConfig = [
  ...next,
  ...typescript,
  { ignores: [".next/**", "node_modules/**", "data/**", "test-results/**", "next-env.d.ts"] },
  // The configuration stands in scripts/, the tree it speaks of is one folder up.
  { settings: { next: { rootDir: "." }, react: { version: "19" } } },
  {
    rules: {
      "max-lines": ["error", { max: 300 }],
      "no-restricted-syntax": ["error", NO_REEXPORT, NO_DEFAULT_EXPORT],
      "@typescript-eslint/no-explicit-any": "error",
      "@typescript-eslint/no-unused-vars": ["error", { ignoreRestSiblings: true }],
      "@typescript-eslint/no-unused-expressions": "error",
      "@typescript-eslint/consistent-type-imports": ["error", { fixStyle: "inline-type-imports" }],
      eqeqeq: ["error", "always"],
      "no-console": "error",
      "prefer-const": "error",
    },
  },
  {
    files: ["lib/**", "policies/**", "models/**", "templates/**", "scripts/**", "app/**/*.ts", "*.ts"],
    rules: { "max-lines-per-function": ["error", { max: 50, skipComments: true, skipBlankLines: true }] },
  },
  {
    files: ["app/**/*.tsx"],
    rules: { "max-lines-per-function": ["error", { max: 200, skipComments: true, skipBlankLines: true }] },
  },
  {
    files: ["lib/**", "policies/**"],
    rules: {
      "@typescript-eslint/consistent-type-assertions": ["error", { assertionStyle: "never" }],
      "@typescript-eslint/no-non-null-assertion": "error",
      "@typescript-eslint/ban-ts-comment": [
        "error",
        { "ts-expect-error": true, "ts-ignore": true, "ts-nocheck": true },
      ],
    },
  },
  {
    files: DEFAULT_EXPORT_FILES,
    rules: { "no-restricted-syntax": ["error", NO_REEXPORT] },
  },
  {
    // What a script says to the person at the terminal is its output.
    files: ["scripts/**"],
    rules: { "no-console": "off" },
  },
  {
    // Playwright calls the hand-over of a fixture "use"; it is no React hook.
    files: ["tests/e2e/**"],
    rules: { "react-hooks/rules-of-hooks": "off" },
  },
];

export default lintConfig;
