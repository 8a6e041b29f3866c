// Mocha's usual list, and the two counts in the file that the environment names, so that several runs can be summed.
const { writeFileSync } = require('node:fs');
const { reporters, Runner } = require('mocha');

module.exports = class CountingReporter extends reporters.Spec {
  constructor(runner, options) {
    super(runner, options);
    runner.once(Runner.constants.EVENT_RUN_END, () => {
      const { passes, failures } = this.stats;
      writeFileSync(process.env.BANDKEEP_COUNTS, JSON.stringify({ passed: passes, failed: failures }));
    });
  }
};
