import type { DemoSheet } from './demoSheet.ts';

/** Free chlorine in a stoppered bottle: first order, 1.86 mg/L at the start, 0.094 per hour, scatter 0.012 mg/L. */
export const chlorine: DemoSheet = {
  name: 'Chlorine',
  columnWidths: [84, 104, 150, 20, 130, 150, 178, 90, 90, 84, 84, 260],
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
      [7, 'spilt', 'cuvette dropped'],
      [8, 0.89, null],
      [10, 0.73, null],
      [12, 0.62, null],
      [16, 0.42, null],
      [20, 0.27, null],
      [24, 0.2, null],
    ],
    E6: [['Constants of first order decay']],
    E7: [['=TAUT.CONSTANTS(A6:A40,B6:B40,"first order")']],
    E12: [['In a sentence']],
    E13: [['=TAUT.STATEMENT(A6:A40,B6:B40,"first order","k","1/h")']],
    E15: [['Which law?']],
    E16: [['=TAUT.COMPARE(A6:A40,B6:B40)']],
    E30: [['Checks']],
    E31: [['=TAUT.CHECKS(A6:A40,B6:B40,"first order")']],
  },
  styles: {
    A1: 'title',
    'A2:A3': 'note',
    'A5:C5': 'header',
    'A6:C40': 'input',
    E6: 'heading',
    'E7:I7': 'header',
    E12: 'heading',
    E13: 'statement',
    E15: 'heading',
    'E16:L16': 'header',
    E30: 'heading',
    'E31:F31': 'header',
  },
  numberFormats: { 'B6:B40': '0.00', 'F8:I10': '0.0000', 'G17:K27': '0.000' },
  followed: { typed: 'A6:B19', x: 'A6:A40', y: 'B6:B40', constants: 'E7', laws: '', more: '' },
};
