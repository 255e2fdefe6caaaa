module.exports = () => globalThis.stopBrowserTests();
