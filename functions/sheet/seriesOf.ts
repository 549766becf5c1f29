import type { FitSettings } from '../../core/given/given.ts';
import { type SplitSeries, splitSeries } from '../../core/series/splitSeries.ts';
import type { Call } from '../call.ts';
import { lawOf, readingsOf, settingsOf } from '../fitting.ts';
import { toCell } from '../fromHost.ts';

/** Several series in one call, and what to do with them. */
export interface Series {
  readonly split: SplitSeries;
  readonly law: string;
  readonly settings: FitSettings;
}

/** The series of a call with `key`, `x`, `y` and `law`. */
export function seriesOf(call: Call): Series {
  const { readings } = readingsOf(call);
  return {
    split: splitSeries(call.raw('key'), readings, toCell),
    law: lawOf(call),
    settings: settingsOf(call, readings.count),
  };
}
