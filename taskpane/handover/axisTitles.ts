import type { Fit } from '../../core/fit/fit.ts';
import { handoverWords } from '../../core/words/handoverWords.ts';
import type { Choice } from '../state/choice.ts';
import { headingText } from './headingText.ts';

export interface AxisTitles {
  readonly xTitle: string;
  readonly yTitle: string;
}

/** Titles of the straight axes: a bare quantity as its column is headed, others with the units of what stands in them. */
export function straightTitles(choice: Choice, fit: Fit): AxisTitles {
  const { form } = fit;
  return {
    xTitle: straightTitle(choice, fit, form.against, form.horizontal.uses),
    yTitle: straightTitle(choice, fit, form.plot, form.vertical.uses),
  };
}

/** Titles of the original axes. */
export function curveTitles({ xHeading, yHeading }: Choice, { law }: Fit): AxisTitles {
  return { xTitle: headingText(xHeading, law.predictor), yTitle: headingText(yHeading, law.response) };
}

function straightTitle(choice: Choice, fit: Fit, text: string, uses: readonly number[]): string {
  const { xHeading, yHeading } = choice;
  const { law } = fit;
  if (text === law.predictor) return headingText(xHeading, law.predictor);
  if (text === law.response) return headingText(yHeading, law.response);
  const units: string[] = [];
  if (uses.includes(1) && yHeading.unit !== '') units.push(handoverWords.inUnit(law.response, yHeading.unit));
  if (uses.includes(0) && xHeading.unit !== '')
    units.push(handoverWords.inUnit(law.predictor, xHeading.unit));
  return handoverWords.straightAxisTitle(text, units);
}
