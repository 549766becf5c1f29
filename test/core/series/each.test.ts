import { describe, expect, test } from '@jest/globals';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import type { Cell } from '../../../core/readings/readings.ts';
import { eachSeries } from '../../../core/series/each.ts';
import { straightness } from '../../../core/straightness/straightness.ts';
import { problemOf } from '../../problemOf.ts';
import { type GivenTexts, readingsFrom, settingsFrom } from '../fit/settings.ts';
import { splitFrom } from './splitFrom.ts';

/** Cells that a key's series holds, where all the cells are. */
interface Cells {
  readonly keys: Cell[];
  readonly x: Cell[];
  readonly y: Cell[];
}

/** Decays of several bottles, mixed row by row, with what goes wrong in practice. */
function bottles(): Cells {
  const cells: Cells = { keys: [], x: [], y: [] };
  for (let row = 0; row < 12; row++) {
    ['north', 'south', 3, 'short'].forEach((key, series) => {
      if (key === 'short' && row > 0) return;
      cells.keys.push(key);
      cells.x.push(row / 2);
      const scatter = 1 + 0.02 * Math.sin(7.7 * row + series);
      cells.y.push(
        row === 5 && key === 'south' ? 'spilt' : (2 - 0.2 * series) * Math.exp(-0.3 * row) * scatter,
      );
    });
  }
  return cells;
}

function each(cells: Cells, law: string, given: GivenTexts = {}) {
  return eachSeries(splitFrom(cells.keys, cells.x, cells.y), law, settingsFrom(given, cells.x.length));
}

describe('EACH gives what CONSTANTS gives for each key, to the last digit', () => {
  test.each<[string, GivenTexts]>([
    ['exponential', {}],
    ['straight line', {}],
    ['exponential', { uY: 'equal' }],
    ['exponential', { uY: 'proportional' }],
    ['exponential', { uY: '2%' }],
    ['exponential', { uY: 0.05, uX: 0.1 }],
    ['exponential', { options: 'fit=direct' }],
    ['reciprocal', {}],
    ['y(x) = p*exp(q*x)', { known: 'p=2' }],
    ['y(x) = p*exp(q*x)', { known: 'p=2±0.1' }],
    ['y(x) = p*exp(q*x)', { known: 'p=2', options: 'intercept=held' }],
    ['y(x) = a*exp(-a*x)', {}],
    ['offset decay', {}],
  ])('%s %o', (law, given) => {
    const cells = bottles();
    const { constants, rows } = each(cells, law, given);
    expect(rows.map(({ key }) => key)).toEqual(['north', 'south', 3, 'short']);
    for (const row of rows) {
      const own = cells.keys.map((key) => key === row.key);
      const pick = (column: readonly Cell[]): Cell[] => column.filter((_, i) => own[i]);
      if (row.key === 'short') {
        expect(row.values).toEqual([]);
        expect(row.note).not.toBe('');
        continue;
      }
      const fit = fitLaw(
        readingsFrom(pick(cells.x), pick(cells.y)),
        law,
        settingsFrom(given, row.readings + 1),
      );
      const settled = fit.constants.filter(({ derived }) => !derived);
      expect(constants).toEqual(settled.map(({ name }) => name));
      expect(row.values).toEqual(
        settled.map(({ value, standardUncertainty }) => ({ value, standardUncertainty })),
      );
      expect(row.rSquared).toBe(fit.line.rSquared);
      expect(row.bowPercent).toBe(straightness(fit).bowPercent);
      expect(row.readings).toBe(row.key === 'south' ? 11 : 12);
      expect(row.note).toBe(row.key === 'south' ? "Reading 18 is set aside: its y is the text 'spilt'." : '');
    }
  });

  test('uncertainties in cells belong to their readings, wherever these stand', () => {
    const cells = bottles();
    const uY = cells.x.map((_, i) => 0.02 + 0.001 * i);
    const { rows } = each(cells, 'exponential', { uY });
    const own = cells.keys.map((key) => key === 'north');
    const fit = fitLaw(
      readingsFrom(
        cells.x.filter((_, i) => own[i]),
        cells.y.filter((_, i) => own[i]),
      ),
      'exponential',
      settingsFrom({ uY: uY.filter((_, i) => own[i]) }, 12),
    );
    expect(rows[0]?.values[1]).toEqual({
      value: fit.constants[1]?.value,
      standardUncertainty: fit.constants[1]?.standardUncertainty,
    });
  });
});

describe('series that cannot be fitted', () => {
  test('keep their row with the reason, which names the reading among all the cells', () => {
    const { rows } = eachSeries(
      splitFrom(['a', 'b', 'a', 'b', 'a', 'b'], [1, 1, 2, 2, 3, 3], [5, 5, 4, -4, 3.2, 3]),
      'exponential',
      settingsFrom(),
    );
    expect(rows[0]?.values).toHaveLength(2);
    expect(rows[1]).toMatchObject({ key: 'b', readings: 3, values: [], rSquared: Number.NaN });
    expect(rows[1]?.note).toMatch(/^Reading 4 .* ln y does not exist/);
  });

  test('two readings give values without uncertainty', () => {
    const { rows } = eachSeries(splitFrom(['a', 'a'], [1, 2], [4, 2]), 'straight line', settingsFrom());
    expect(rows[0]?.values.map(({ value }) => value)).toEqual([6, -2]);
    expect(rows[0]?.values.every(({ standardUncertainty }) => Number.isNaN(standardUncertainty))).toBe(true);
  });

  test('a key with no readings yet says so; blank keys belong to no series', () => {
    const { rows } = eachSeries(
      splitFrom(['a', ' a ', '', null, 'b'], [1, 2, 3, 4, 5], [1, 2, 3, 4, null]),
      'straight line',
      settingsFrom(),
    );
    expect(rows.map(({ key, readings }) => [key, readings])).toEqual([
      ['a', 2],
      ['b', 0],
    ]);
    expect(rows[1]?.note).toBe('There are no readings yet.');
  });

  test('a number and a text that looks like it are two keys', () => {
    const { rows } = eachSeries(splitFrom([1, '1'], [1, 2], [1, 2]), 'proportional', settingsFrom());
    expect(rows.map(({ key }) => key)).toEqual([1, '1']);
  });
});

describe('refusals', () => {
  test('an error in a key, blank keys, an unknown law', () => {
    const settings = settingsFrom();
    const x = [1, 2];
    expect(
      problemOf(() => eachSeries(splitFrom([{ error: '#REF!' }, 'a'], x, x), 'power', settings)),
    ).toMatchObject({
      code: 'cell',
      argument: 'key',
      cellError: '#REF!',
    });
    expect(problemOf(() => eachSeries(splitFrom(['', null], x, x), 'power', settings))).toMatchObject({
      code: 'argument',
      argument: 'key',
    });
    expect(problemOf(() => eachSeries(splitFrom(['a', 'a'], x, x), 'powr', settings)).argument).toBe('law');
  });
});
