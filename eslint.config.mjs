import globals from "globals";
import tseslint from "typescript-eslint";

export default tseslint.config(
  { ignores: ["dist/", "node_modules/", "coverage/"] },
  {
    files: ["**/*.ts"],
    extends: [...tseslint.configs.recommended],
    rules: {
      "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_", caughtErrorsIgnorePattern: "^_" }],
      "@typescript-eslint/consistent-type-imports": "error",
      "no-eval": "error",
      "no-new-func": "error",
      eqeqeq: "error",
      "prefer-const": "error",
      "no-console": "error",
    },
  },
  // the metadata generator reads any[][] only
  { files: ["functions/*.ts"], rules: { "@typescript-eslint/no-explicit-any": "off" } },
  { files: ["tests/**/*.ts", "src/commands/**", "assets/**"], rules: { "no-console": "off" } },
  {
    files: ["**/*.{js,cjs,mjs}"],
    languageOptions: { globals: globals.node, ecmaVersion: 2023, sourceType: "module" },
    rules: { "no-undef": "error", "no-unused-vars": ["error", { argsIgnorePattern: "^_" }], eqeqeq: "error", "prefer-const": "error" },
  },
  { files: ["**/*.cjs", "webpack.config.js"], languageOptions: { sourceType: "commonjs" } },
);
