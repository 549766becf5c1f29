import type { Fit } from '../../core/fit/fit.ts';
import { handoverWords } from '../../core/words/handoverWords.ts';
import type { WorkingsSource } from '../../core/workings/desk.ts';
import { cellAt } from '../state/cellOfReading.ts';
import type { Choice, Place, SpreadEntry } from '../state/choice.ts';
import { headingText } from './headingText.ts';
import { fixedPlace, literalArguments, sheetCall } from './sheetCall.ts';

/** Where the workings on a sheet of their own find the readings, and how they call the live functions. */
export function workingsSource(choice: Choice, fit: Fit, on: string): WorkingsSource {
  const cells = (place: Place) => (position: number) => fixedPlace(cellAt(place, position) ?? place, on);
  const spread = (entry: SpreadEntry) => (entry.kind === 'range' ? cells(entry.place) : null);
  const given = literalArguments(choice, fit, on);
  const { law } = fit;
  return {
    title: handoverWords.measured(
      headingText(choice.yHeading, law.response),
      headingText(choice.xHeading, law.predictor),
    ),
    x: cells(choice.x),
    y: cells(choice.y),
    uY: spread(choice.spreadY),
    uX: spread(choice.spreadX),
    call: (name, own) => sheetCall(name, given, own),
  };
}
