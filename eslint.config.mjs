import nextVitals from "eslint-config-next/core-web-vitals";
import nextTypescript from "eslint-config-next/typescript";
import prettier from "eslint-config-prettier/flat";
import { defineConfig, globalIgnores } from "eslint/config";

export default defineConfig([
  globalIgnores([
    ".next/",
    ".data/",
    "node_modules/",
    "next-env.d.ts",
    "test-results/",
    "playwright-report/",
    "public/sw.js",
  ]),
  ...nextVitals,
  ...nextTypescript,
  prettier,
  {
    linterOptions: { reportUnusedDisableDirectives: "error" },
    rules: {
      "max-lines": ["error", 400],
      "no-console": "error",
      eqeqeq: ["error", "always"],
    },
  },
  {
    files: ["**/*.ts", "**/*.tsx"],
    rules: {
      "@typescript-eslint/no-explicit-any": "error",
      "@typescript-eslint/no-non-null-assertion": "error",
      "@typescript-eslint/ban-ts-comment": "error",
      "@typescript-eslint/consistent-type-imports": [
        "error",
        { fixStyle: "inline-type-imports", disallowTypeAnnotations: false },
      ],
      "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_" }],
    },
  },
  {
    // The engine knows no machine: no clock, no chance, no environment. Everything comes in as an argument.
    files: ["lib/engine/**"],
    rules: {
      "no-restricted-globals": [
        "error",
        "process",
        "fetch",
        "window",
        "document",
        "performance",
        "setTimeout",
      ],
      "no-restricted-syntax": [
        "error",
        {
          selector: "NewExpression[callee.name='Date'][arguments.length=0]",
          message: "Today is an argument.",
        },
        {
          selector: "MemberExpression[object.name='Date'][property.name='now']",
          message: "Today is an argument.",
        },
        {
          selector: "MemberExpression[object.name='Math'][property.name='random']",
          message: "The engine is deterministic.",
        },
      ],
    },
  },
  {
    // What runs in a terminal talks to it.
    files: [
      "lib/run/**",
      "db/*.mjs",
      "db/seed/**",
      "lib/mail/catcher.mjs",
      "tests/bench/**",
      "tests/setup/**",
    ],
    rules: { "no-console": "off" },
  },
]);
