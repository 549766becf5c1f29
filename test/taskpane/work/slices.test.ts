import { expect, test } from '@jest/globals';
import { inSlices } from '../../../taskpane/work/slices.ts';

/** Steps that each take so many milliseconds of a clock that the test holds. */
function clocked(count: number, each: number) {
  let time = 0;
  let done = 0;
  function* steps() {
    for (let i = 0; i < count; i++) {
      time += each;
      done++;
      yield;
    }
  }
  return { steps: steps(), now: () => time, done: () => done };
}

test('the page gets a turn before a slice grows long', async () => {
  const { steps, now } = clocked(10, 15);
  const told: number[] = [];
  const finished = await inSlices(steps, new AbortController().signal, (done) => told.push(done), now);
  expect(finished).toBe(true);
  // 15 ms a step: a slice ends with the step that passes 40 ms.
  expect(told).toEqual([3, 6, 9]);
});

test('a cancelled run stops before its next step', async () => {
  const { steps, now, done } = clocked(10, 50);
  const controller = new AbortController();
  const finished = await inSlices(steps, controller.signal, () => controller.abort(), now);
  expect([finished, done()]).toEqual([false, 1]);
});

test('a step that throws ends the run with its error', async () => {
  function* failing() {
    yield;
    throw new Error('step');
  }
  await expect(inSlices(failing(), new AbortController().signal)).rejects.toThrow('step');
});
