import { describe, expect, test } from '@jest/globals';
import type { Choice } from '../../../taskpane/state/choice.ts';
import { noChoice } from '../../../taskpane/state/noChoice.ts';
import { loadChoice, saveChoice } from '../../../taskpane/state/savedChoice.ts';

const full: Choice = {
  x: { sheet: 'Cold room', address: 'A4:A40' },
  y: { sheet: 'Cold room', address: 'B4:B40' },
  xHeading: { name: 't', unit: 'min' },
  yHeading: { name: 'T', unit: '°C' },
  law: 'T(t) = Ta + (T0 - Ta)*exp(-t/tau)',
  ownLaws: ['T(t) = Ta + (T0 - Ta)*exp(-t/tau)'],
  known: [{ name: 'Ta', text: '4.1±0.2' }],
  spreadY: { kind: 'range', place: { sheet: 'Cold room', address: 'C4:C40' } },
  spreadX: { kind: 'text', text: '2%' },
  options: new Map([['coverage', '0.99']]),
  leftOut: [3, 7],
  units: new Map([['tau', 'min']]),
};

test('a choice comes back from the workbook as it was', () => {
  expect(loadChoice(saveChoice(full))).toEqual(full);
  expect(loadChoice(saveChoice(noChoice))).toEqual(noChoice);
});

describe('what another hand left', () => {
  test.each([null, 7, '', '{', '[]', '{"version":2,"choice":{}}', '{"version":1,"choice":null}'])(
    '%j is no choice',
    (saved) => {
      expect(loadChoice(saved)).toBeUndefined();
    },
  );

  test('unreadable parts keep their defaults, the others count', () => {
    const saved = JSON.stringify({
      version: 1,
      choice: {
        x: { sheet: 'S', address: 'A1:A9' },
        y: 'B1:B9',
        law: 'power',
        ownLaws: ['y = a*x', 4],
        known: [{ name: 'a' }, 'b'],
        spreadY: { kind: 'range' },
        options: [
          ['coverage', 0.99],
          ['form', '2'],
        ],
        leftOut: [1, 'two', 2.5],
      },
    });
    expect(loadChoice(saved)).toEqual({
      ...noChoice,
      x: { sheet: 'S', address: 'A1:A9' },
      law: 'power',
      ownLaws: ['y = a*x'],
      known: [{ name: 'a', text: '' }],
      options: new Map([['form', '2']]),
      leftOut: [1],
    });
  });
});
