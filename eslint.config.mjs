import coreWebVitals from "eslint-config-next/core-web-vitals";
import typescript from "eslint-config-next/typescript";

const pure = [
  "next",
  "next/*",
  "react",
  "react-dom",
  "drizzle-orm",
  "drizzle-orm/*",
  "pg",
  "lucia",
  "node:*",
  "@/db/*",
  "@/lib/server/*",
  "@/app/*",
  "@/components/*",
];

const config = [
  { ignores: [".next/**", "node_modules/**", "coverage/**", "next-env.d.ts"] },
  ...coreWebVitals,
  ...typescript,
  {
    rules: {
      "no-empty": ["error", { allowEmptyCatch: false }],
      "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_" }],
      "@typescript-eslint/no-explicit-any": "error",
    },
  },
  {
    files: ["lib/calc/**/*.ts", "lib/notify/**/*.ts"],
    rules: { "no-restricted-imports": ["error", { patterns: [...pure, "@/templates/*"] }] },
  },
  {
    files: ["components/**/*.tsx", "components/**/*.ts"],
    rules: {
      "no-restricted-imports": ["error", { patterns: ["@/db/*", "@/lib/server/*", "drizzle-orm", "pg", "lucia"] }],
    },
  },
];
export default config;
