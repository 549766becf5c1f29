import type { DemoSheet } from './demoSheet.ts';

/** Free chlorine in a stoppered bottle: first order, 1.86 mg/L at the start, 0.094 per hour, scatter 0.012 mg/L. */
export const chlorine: DemoSheet = {
  name: 'Chlorine',
  columnWidths: [92, 104, 190, 24, 150, 110, 130, 96, 96, 84, 84, 260],
  frozenRows: 5,
  blocks: {
    A1: [['Chlorine decay, bottle test 1']],
    A2: [
      [
        'Ellowmere Water, laboratory. Stoppered bottle from the Upper Field tank, 12 °C in the dark, DPD photometer.',
      ],
    ],
    A3: [
      [
        'Wanted by the plant manager: how fast does free chlorine fall, how sure are we, and is one constant enough?',
      ],
    ],
    A5: [['time / h', 'C / (mg/L)', 'remark']],
    A6: [
      [0, 1.86, null],
      [0.5, 1.77, null],
      [1, 1.7, null],
      [2, 1.54, null],
      [3, 1.42, null],
      [4, 1.26, null],
      [6, 1.06, null],
      [7, 'spilt', 'cuvette dropped, no second sample'],
      [8, 0.89, null],
      [10, 0.73, null],
      [12, 0.62, null],
      [16, 0.42, null],
      [20, 0.27, null],
      [24, 0.2, null],
    ],
    E5: [['Constants of first order decay']],
    E6: [['=TAUT.CONSTANTS(A6:A40,B6:B40,"first order")']],
    E11: [['In a sentence']],
    E12: [['=TAUT.STATEMENT(A6:A40,B6:B40,"first order","k","1/h")']],
    E14: [['Which law?']],
    E15: [['=TAUT.COMPARE(A6:A40,B6:B40)']],
    E29: [['Checks']],
    E30: [['=TAUT.CHECKS(A6:A40,B6:B40,"first order")']],
  },
  styles: {
    A1: 'title',
    'A2:A3': 'note',
    'A5:C5': 'header',
    'A6:C40': 'input',
    E5: 'heading',
    'E6:I6': 'header',
    E11: 'heading',
    E12: 'statement',
    E14: 'heading',
    'E15:L15': 'header',
    E29: 'heading',
    'E30:F30': 'header',
  },
  numberFormats: { 'B6:B40': '0.00', 'F7:I9': '0.0000', 'G16:K26': '0.000' },
  followed: { typed: 'A6:B19', x: 'A6:A40', y: 'B6:B40', constants: 'E6', laws: '', more: '' },
};
