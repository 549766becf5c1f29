/** Prints one plain line after the run, "N passed, N failed", that any log reader can count. */
export default class ClosingLine {
  onRunComplete(_contexts, results) {
    const failed = results.numFailedTests + results.numRuntimeErrorTestSuites;
    const skipped = results.numPendingTests + results.numTodoTests;
    const tail = skipped > 0 ? `, ${skipped} skipped` : '';
    process.stdout.write(`\n${results.numPassedTests} passed, ${failed} failed${tail}\n`);
  }
}
