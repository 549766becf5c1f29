/** What work in steps comes to, done without a pause. */
export function allSteps<T>(steps: Generator<unknown, T>): T {
  for (let step = steps.next(); ; step = steps.next()) if (step.done === true) return step.value;
}
