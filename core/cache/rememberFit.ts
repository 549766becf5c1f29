import type { Fit } from '../fit/fit.ts';
import { fitLaw } from '../fit/fitLaw.ts';
import type { FitSettings, Spread } from '../given/given.ts';
import { optionNames } from '../given/parseOptions.ts';
import { type Cache, sharedCache } from './cache.ts';
import { contentKey } from './contentKey.ts';
import type { KeyedReadings } from './rememberReadings.ts';

function spreadKey(cache: Cache, spread: Spread): string {
  return spread.kind === 'each' ? contentKey(cache, 'spread', [spread.values]) : JSON.stringify(spread);
}

/** A key that stands for everything besides the readings and the law that a fit depends on. */
export function settingsKey(settings: FitSettings, cache: Cache = sharedCache): string {
  const { known, spreadY, spreadX, options } = settings;
  return JSON.stringify([
    [...known].map(([name, { value, standardUncertainty }]) => [name, value, standardUncertainty]),
    spreadKey(cache, spreadY),
    spreadKey(cache, spreadX),
    optionNames.map((name) => options[name]),
  ]);
}

/** A key that stands for a fit: readings, law and settings. */
export function fitKey(
  keyed: KeyedReadings,
  law: string,
  settings: FitSettings,
  cache: Cache = sharedCache,
): string {
  return `${keyed.key}|${settingsKey(settings, cache)}|${law.trim()}`;
}

/**
 * A law fitted to readings, once per distinct input; a fit that stops is remembered with its problem.
 * @throws what `fitLaw` throws
 */
export function rememberFit(
  keyed: KeyedReadings,
  law: string,
  settings: FitSettings,
  cache: Cache = sharedCache,
): Fit {
  return cache.remember(`fit|${fitKey(keyed, law, settings, cache)}`, () =>
    fitLaw(keyed.readings, law, settings),
  );
}
