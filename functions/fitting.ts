import { rememberFit } from '../core/cache/rememberFit.ts';
import { type KeyedReadings, rememberReadings } from '../core/cache/rememberReadings.ts';
import type { ConstantEstimate, Fit } from '../core/fit/fit.ts';
import type { FitSettings } from '../core/given/given.ts';
import { parseKnown } from '../core/given/parseKnown.ts';
import { parseOptions } from '../core/given/parseOptions.ts';
import { parseSpread, requireKnownUncertainty } from '../core/given/parseSpread.ts';
import { Problem } from '../core/problem.ts';
import { functionWords } from '../core/words/functionWords.ts';
import type { Call } from './call.ts';
import { showsBlanks } from './fromHost.ts';

/** The readings in a call's `x` and `y`, read once per distinct content. */
export function readingsOf(call: Call): KeyedReadings {
  const { blankPairs } = call;
  return rememberReadings(call.range('x'), call.range('y'), {
    blanks: 'maybeZero',
    ...(blankPairs === undefined ? {} : { blankPairs }),
  });
}

/** The known constants, uncertainties and options of a call, for as many pairs of cells as `count`. */
export function settingsOf(call: Call, count: number): FitSettings {
  const known = parseKnown(call.given('known'));
  const blanks = showsBlanks(call.range('x'), call.range('y')) ? 'distinct' : 'maybeZero';
  const spreadY = parseSpread('u_y', call.given('u_y'), count, blanks);
  const spreadX = parseSpread('u_x', call.given('u_x'), count, blanks);
  requireKnownUncertainty(spreadY, spreadX);
  return { known, spreadY, spreadX, options: parseOptions(call.given('options')) };
}

/** The law of a call as text. */
export function lawOf(call: Call): string {
  return call.requiredText('law', 'the name of a law or an equation');
}

/** The fit that a call asks for, computed once per distinct input. */
export function fitOf(call: Call): Fit {
  const keyed = readingsOf(call);
  return rememberFit(keyed, lawOf(call), settingsOf(call, keyed.readings.count));
}

/**
 * The constant that a call names, among those that the fit settles or derives.
 * @throws Problem `argument` listing them
 */
export function constantOf(call: Call, fit: Fit): ConstantEstimate {
  const wanted = call.requiredText('name', 'the symbol of a constant');
  const found = fit.constants.find((constant) => constant.name === wanted);
  if (found !== undefined) return found;
  const names = fit.constants.map((constant) => constant.name);
  throw new Problem('argument', 'name', functionWords.constant(wanted, names));
}
