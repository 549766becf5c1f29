import { givenConstants, lawInputs, PREDICTOR, RESPONSE } from '../fit/columns.ts';
import { chosenForm } from '../fit/fitTask.ts';
import type { FitSettings } from '../given/given.ts';
import type { ColumnFunction, Law } from '../law/law.ts';
import type { Readings } from '../readings/readings.ts';
import { judgeWords } from '../words/judgeWords.ts';

/**
 * Which reading lies outside a law's straight axes, and on which of them: `ln y: reading 4 is 0`.
 * @param constants values of all constants that the axes need, aligned with `law.constants`; the known ones by default
 * @returns null when every reading can be drawn
 */
export function outsideReason(
  { x, y, position }: Readings,
  law: Law,
  settings: FitSettings,
  constants: Float64Array = givenConstants(law, settings.known),
): string | null {
  const form = chosenForm(law, settings.options.form);
  const inputs = lawInputs(x, y, constants);
  const axes: readonly (readonly [ColumnFunction, string])[] = [
    [form.vertical, form.plot],
    [form.horizontal, form.against],
  ];
  for (const [axis, text] of axes) {
    const values = axis.evaluate(inputs, x.length);
    const index = x.findIndex((_, i) => !Number.isFinite(values[i]));
    if (index < 0) continue;
    const at = position[index] ?? 0;
    const ofX = axis.uses.includes(PREDICTOR);
    const ofY = axis.uses.includes(RESPONSE);
    const origin = passesOrigin(law, x[index] ?? Number.NaN, y[index] ?? Number.NaN);
    if (ofX && ofY) {
      return judgeWords.outsideBoth(
        text,
        at,
        [law.predictor, x[index] ?? 0],
        [law.response, y[index] ?? 0],
        origin,
      );
    }
    return judgeWords.outside(text, at, (ofX ? x : y)[index] ?? 0, origin ? law.name : '');
  }
  return null;
}

/** Whether the reading is the origin and the law one that cannot pass through it. */
function passesOrigin(law: Law, x: number, y: number): boolean {
  return x === 0 && y === 0 && law.name === 'exponential';
}
