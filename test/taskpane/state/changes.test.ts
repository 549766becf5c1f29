import { describe, expect, test } from '@jest/globals';
import {
  losesSpread,
  swapped,
  withColumn,
  withKnown,
  withLaw,
  withLeftOut,
  withOption,
  withOwnLaw,
  withoutOwnLaw,
  withReadings,
  withUnit,
} from '../../../taskpane/state/changes.ts';
import type { Choice } from '../../../taskpane/state/choice.ts';
import { noChoice } from '../../../taskpane/state/noChoice.ts';

const at = (address: string) => ({ sheet: 'S', address });
const choice: Choice = {
  ...noChoice,
  x: at('A1:A9'),
  y: at('B1:B9'),
  xHeading: { name: 't', unit: 'h' },
  yHeading: { name: 'C', unit: 'mg/L' },
  law: 'power',
  options: new Map([['form', '2']]),
};

test('another law starts with its first straight form, the same law keeps its own', () => {
  expect(withLaw(choice, 'root').options.has('form')).toBe(false);
  expect(withLaw(choice, 'power').options.get('form')).toBe('2');
  expect(choice.options.get('form')).toBe('2');
});

test('what is known of a general law’s letters stays with that law', () => {
  const known = withKnown(withKnown(withUnit(choice, 'q', '1/h'), 'q', '1.5'), 'C0', '2');
  expect(withLaw(known, 'exponential')).toMatchObject({ known: [{ name: 'C0' }], units: new Map() });
  const own = withLaw(known, 'first order');
  expect(own.known).toEqual([{ name: 'C0', text: '2' }]);
  expect(withLaw(own, 'C(t) = C0/(1 + k*C0*t)').known).toEqual(own.known);
});

test('an own law counts once, and leaves with its choice', () => {
  const one = withOwnLaw(withOwnLaw(choice, ' y = a*x '), 'y = a*x');
  expect(one.ownLaws).toEqual(['y = a*x']);
  expect(withOwnLaw(choice, '  ')).toBe(choice);
  expect(withoutOwnLaw(withLaw(one, 'y = a*x'), 'y = a*x')).toMatchObject({ ownLaws: [], law: '' });
  expect(withoutOwnLaw(one, 'y = a*x').law).toBe('power');
});

test('a known constant is replaced, and forgotten when its text is blank', () => {
  const known = withKnown(withKnown(choice, 'R', '10'), 'R', ' 12±1 ');
  expect(known.known).toEqual([{ name: 'R', text: '12±1' }]);
  expect(withKnown(known, 'R', ' ').known).toEqual([]);
});

test('options and units at their defaults are not kept', () => {
  const set = withUnit(withOption(choice, 'coverage', '0.99'), 'k', ' 1/h ');
  expect([set.options.get('coverage'), set.units?.get('k')]).toEqual(['0.99', '1/h']);
  const back = withUnit(withOption(set, 'coverage', undefined), 'k', '');
  expect([back.options.has('coverage'), back.units?.size]).toEqual([false, 0]);
});

describe('x and y', () => {
  test('change places with all that belongs to them; words that only y knows stay behind', () => {
    const uncertain: Choice = {
      ...choice,
      spreadX: { kind: 'text', text: '0.1' },
      spreadY: { kind: 'text', text: 'proportional' },
    };
    expect(swapped(uncertain)).toMatchObject({
      x: at('B1:B9'),
      y: at('A1:A9'),
      xHeading: { name: 'C' },
      yHeading: { name: 't' },
      spreadX: { text: '' },
      spreadY: { text: '0.1' },
    });
  });

  test('another column takes the place of one, or swaps with the other', () => {
    const other = withColumn(withLeftOut(choice, 3, true), 'y', at('C1:C9'), { name: 'R', unit: '' });
    expect(other).toMatchObject({ x: at('A1:A9'), y: at('C1:C9'), yHeading: { name: 'R' }, leftOut: [] });
    expect(withColumn(choice, 'x', choice.y, choice.yHeading)).toMatchObject({ x: choice.y, y: choice.x });
  });

  test('new readings forget uncertainties in cells and readings left out, nothing else', () => {
    const before: Choice = {
      ...withLeftOut(choice, 2, true),
      spreadY: { kind: 'range', place: at('C1:C9') },
      spreadX: { kind: 'text', text: '1%' },
    };
    const { x, y, xHeading, yHeading } = choice;
    const after = withReadings(before, { x, y, xHeading, yHeading });
    expect(after).toEqual({ ...before, spreadY: { kind: 'text', text: '' }, leftOut: [] });
    expect([losesSpread(before, after), losesSpread(choice, after)]).toEqual([true, false]);
  });
});

test('readings left out are kept in order, and each once', () => {
  const out = withLeftOut(withLeftOut(withLeftOut(choice, 7, true), 3, true), 7, true);
  expect(out.leftOut).toEqual([3, 7]);
  expect(withLeftOut(out, 3, false).leftOut).toEqual([7]);
});
