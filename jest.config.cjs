const common = {
  transform: { "^.+\\.(ts|mts)$": ["@swc/jest", { jsc: { target: "es2022", parser: { syntax: "typescript" } } }] },
  extensionsToTreatAsEsm: [],
  modulePathIgnorePatterns: ["<rootDir>/dist/"],
};

/** Three kinds of test: plain ones; those that drive the calculation engine in Node; those that drive the bench in a browser. */
module.exports = {
  projects: [
    { ...common, displayName: "unit", testMatch: ["<rootDir>/tests/**/*.test.ts"], testPathIgnorePatterns: ["/node_modules/", "/tests/engine/", "/tests/browser/"] },
    { ...common, displayName: "engine", testMatch: ["<rootDir>/tests/engine/**/*.test.ts"], testEnvironment: "<rootDir>/tests/engine/environment.cjs" },
    { ...common, displayName: "browser", testMatch: ["<rootDir>/tests/browser/**/*.test.ts"], globalSetup: "<rootDir>/tests/browser/setup.cjs", globalTeardown: "<rootDir>/tests/browser/teardown.cjs" },
  ],
};
