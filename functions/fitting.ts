import { rememberFit } from '../core/cache/rememberFit.ts';
import { type KeyedReadings, rememberReadings } from '../core/cache/rememberReadings.ts';
import type { ConstantEstimate, Fit } from '../core/fit/fit.ts';
import { isRange } from '../core/given/cellText.ts';
import type { FitSettings, Spread } from '../core/given/given.ts';
import { parseKnown } from '../core/given/parseKnown.ts';
import { parseOptions } from '../core/given/parseOptions.ts';
import { parseSpread, requireKnownUncertainty, type SpreadArgument } from '../core/given/parseSpread.ts';
import { Problem } from '../core/problem.ts';
import { functionWords } from '../core/words/functionWords.ts';
import type { Call } from './call.ts';
import { showsBlanks, toCell } from './fromHost.ts';

/** The readings in a call's `x` and `y`, read once per distinct content. */
export function readingsOf(call: Call): KeyedReadings {
  const { blankPairs } = call;
  return rememberReadings(call.raw('x'), call.raw('y'), {
    blanks: 'maybeZero',
    toCell,
    ...(blankPairs === undefined ? {} : { blankPairs }),
  });
}

/** The known constants, uncertainties and options of a call, for as many pairs of cells as `count`. */
export function settingsOf(call: Call, count: number): FitSettings {
  const known = parseKnown(call.given('known'));
  const spreadY = spreadOf(call, 'u_y', count);
  const spreadX = spreadOf(call, 'u_x', count);
  requireKnownUncertainty(spreadY, spreadX);
  return { known, spreadY, spreadX, options: parseOptions(call.given('options')) };
}

/** One uncertainty of a call; a 0 in a range of them may be a blank cell unless the host has shown otherwise. */
function spreadOf(call: Call, argument: SpreadArgument, count: number): Spread {
  const given = call.given(argument);
  if (!isRange(given)) return parseSpread(argument, given, count);
  const distinct = showsBlanks(call.range('x')) || showsBlanks(call.range('y'));
  return parseSpread(argument, given, count, distinct ? 'distinct' : 'maybeZero');
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
 * @throws Problem `argument` listing them; `undefined` when the constant does not exist for these readings
 */
export function constantOf(call: Call, fit: Fit): ConstantEstimate {
  const wanted = call.requiredText('name', 'the symbol of a constant');
  const found = fit.constants.find((constant) => constant.name === wanted);
  if (found !== undefined) {
    if (Number.isFinite(found.value)) return found;
    throw new Problem('undefined', 'name', functionWords.noConstant(wanted));
  }
  const names = fit.constants.map((constant) => constant.name);
  throw new Problem('argument', 'name', functionWords.constant(wanted, names));
}
