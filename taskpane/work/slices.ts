/** Work goes on for this long before the page gets a turn, in milliseconds. */
const SLICE = 40;

/** Lets the page paint and answer before work goes on. */
function nextTurn(): Promise<void> {
  return new Promise((resolve) => {
    const { port1, port2 } = new MessageChannel();
    port1.onmessage = () => {
      port1.close();
      resolve();
    };
    port2.postMessage(null);
  });
}

/**
 * Runs steps one after the other in slices, so that the page stays awake between them.
 * @param steps each call to `next` is one step
 * @param told called between slices with the number of steps done
 * @returns true when all steps were done, false when it was cancelled
 */
export async function inSlices(
  steps: Iterator<unknown>,
  signal: AbortSignal,
  told: (done: number) => void = () => undefined,
  now: () => number = () => performance.now(),
): Promise<boolean> {
  let done = 0;
  for (;;) {
    await nextTurn();
    const start = now();
    do {
      if (signal.aborted) return false;
      if (steps.next().done === true) return true;
      done++;
    } while (now() - start < SLICE);
    told(done);
  }
}
