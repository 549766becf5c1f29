import type { FitSettings } from '../given/given.ts';
import type { Law, StraightForm } from '../law/law.ts';
import { Problem } from '../problem.ts';
import type { Readings, SetAside } from '../readings/readings.ts';
import { fitWords } from '../words/fitWords.ts';
import { indices, pick } from './columns.ts';

/** What is fitted: a law in one straight form, and the readings that take part. */
export interface FitTask {
  readonly law: Law;
  readonly form: StraightForm;
  readonly settings: FitSettings;
  /** Predictor, response and 1-based position of the readings that take part, n. */
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly position: Int32Array;
}

/** The straight form that the options ask for. @throws Problem `argument` when there is no such form */
export function chosenForm(law: Law, number: number): StraightForm {
  const form = law.forms[number - 1];
  if (form === undefined) {
    const what = law.name || law.equation;
    throw new Problem('argument', 'options', fitWords.formRange(number, law.forms.length, what));
  }
  return form;
}

/** The readings that take part: all complete ones, less those whose own uncertainty is missing. */
export function takingPart(
  readings: Readings,
  { spreadY, spreadX }: FitSettings,
): { readonly taking: Int32Array; readonly setAside: readonly SetAside[] } {
  const all = indices(readings.x.length);
  const own = [
    ['u_y', spreadY],
    ['u_x', spreadX],
  ] as const;
  if (own.every(([, spread]) => spread.kind !== 'each')) return { taking: all, setAside: [] };
  const setAside: SetAside[] = [];
  const taking = all.filter((index) => {
    const position = readings.position[index] ?? 0;
    for (const [argument, spread] of own) {
      if (spread.kind !== 'each' || (spread.values[position - 1] ?? Number.NaN) > 0) continue;
      setAside.push({
        position,
        reason: 'noUncertainty',
        message: fitWords.noUncertainty(position, argument),
      });
      return false;
    }
    return true;
  });
  return { taking, setAside };
}

/** The task for the readings at the indices `taking`. */
export function fitTask(law: Law, readings: Readings, taking: Int32Array, settings: FitSettings): FitTask {
  return {
    law,
    form: chosenForm(law, settings.options.form),
    settings,
    x: pick(readings.x, taking),
    y: pick(readings.y, taking),
    position:
      taking.length === readings.position.length
        ? readings.position
        : taking.map((i) => readings.position[i] ?? 0),
  };
}
