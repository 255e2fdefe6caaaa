// The engine's CommonJS build requires ES modules. Node itself can do that; jest's sandbox cannot. So the engine is loaded by Node's own require.
const { TestEnvironment } = require("jest-environment-node");

module.exports = class extends TestEnvironment {
  async setup() {
    await super.setup();
    this.global.nodeRequire = require;
  }
};
