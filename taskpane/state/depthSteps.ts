import { rememberFit } from '../../core/cache/rememberFit.ts';
import type { KeyedReadings } from '../../core/cache/rememberReadings.ts';
import { checkSteps } from '../../core/judge/checks.ts';
import type { Choice } from './choice.ts';
import { constantsOf } from './lawSymbols.ts';
import { attempt, valueIn } from './outcome.ts';
import type { Depth } from './panelState.ts';
import { readingRows } from './readingRows.ts';
import { inputProblems, settingsFor } from './settingsFor.ts';
import type { SheetCells } from './sheetCells.ts';

/** The chosen law on the readings, step by step: each step knows more. Nothing when no law is chosen. */
export function* depthSteps(choice: Choice, cells: SheetCells, keyed: KeyedReadings): Generator<Depth> {
  if (choice.law === '') return;
  const constants = constantsOf(choice.law);
  const { count } = keyed.readings;
  const inputs = inputProblems(choice, constants, cells, count);
  const outcome = attempt(() => {
    const fit = rememberFit(keyed, choice.law, settingsFor(choice, constants, cells, count));
    // Constants by simulation take their time: here rather than while the page is drawn.
    attempt(() => fit.constants);
    return fit;
  });
  let depth: Depth = { choice, constants, fit: outcome, inputs, findings: null, rows: null };
  yield depth;
  const fit = valueIn(outcome);
  if (fit === undefined) return;
  depth = { ...depth, rows: attempt(() => readingRows(fit, choice.leftOut)) };
  yield depth;
  const checking = checkSteps(fit);
  for (;;) {
    const step = attempt(() => checking.next());
    if ('problem' in step) {
      yield { ...depth, findings: step };
      return;
    }
    const { value: checked } = step;
    if (checked.done === true) {
      yield { ...depth, findings: { value: checked.value } };
      return;
    }
    yield depth;
  }
}
