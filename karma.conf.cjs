const { writeFileSync } = require('node:fs');

/** Writes how many specs passed and failed to the file that the test script names. */
function CountsReporter() {
  const counts = { passed: 0, failed: 0 };
  this.onSpecComplete = (_browser, result) => {
    if (result.success && !result.skipped) counts.passed += 1;
    else counts.failed += 1; // a skipped spec proves nothing
  };
  this.onRunComplete = () => {
    if (process.env.KINVALE_COUNTS)
      writeFileSync(process.env.KINVALE_COUNTS, JSON.stringify(counts));
  };
}

module.exports = (config) => {
  config.set({
    frameworks: ['jasmine'],
    plugins: [
      require('karma-jasmine'),
      require('karma-chrome-launcher'),
      require('karma-coverage'),
      { 'reporter:counts': ['type', CountsReporter] },
    ],
    reporters: ['dots', 'counts'],
    hostname: '127.0.0.1',
    listenAddress: '127.0.0.1',
    customLaunchers: {
      ChromiumWithoutSandbox: {
        base: 'ChromiumHeadless',
        flags: [
          '--no-sandbox',
          '--disable-gpu',
          '--disable-dev-shm-usage',
          '--disable-background-networking',
        ],
      },
    },
    browserNoActivityTimeout: 120_000,
    client: { jasmine: { random: true, failSpecWithNoExpectations: true } },
  });
};
