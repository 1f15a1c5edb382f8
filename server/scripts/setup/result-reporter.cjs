const { writeFileSync } = require('node:fs');

/** Jest reporter that writes the counts of a run to the file that ROWCALL_RESULT names, for the closing line. */
module.exports = class ResultReporter {
  onRunComplete(_contexts, results) {
    const { numPassedTests, numFailedTests, numPendingTests, numTodoTests, numRuntimeErrorTestSuites } = results;
    const counts = {
      passed: numPassedTests,
      // A file that could not run holds at least one test that did not pass.
      failed: numFailedTests + numRuntimeErrorTestSuites,
      skipped: numPendingTests + numTodoTests,
    };
    if (process.env.ROWCALL_RESULT) writeFileSync(process.env.ROWCALL_RESULT, JSON.stringify(counts));
  }
};
