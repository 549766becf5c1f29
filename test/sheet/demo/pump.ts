import type { DemoSheet } from './demoSheet.ts';

/** Wear ring clearance of a well pump: 9 µm + 1.36 µm √(t/h), scatter 1.3 µm, read with feelers to 1 µm. */
export const pump: DemoSheet = {
  name: 'Pump',
  columnWidths: [104, 118, 190, 20, 130, 150, 178, 90, 90, 84, 84, 260],
  frozenRows: 5,
  blocks: {
    A1: [['Wear of the well 3 pump against hours run']],
    A2: [
      [
        'Ellowmere Water, maintenance. Clearance of the lower wear ring at each inspection, feeler gauge, pump stopped.',
      ],
    ],
    A3: [
      [
        'Wanted by the maintenance planner: does wear slow down, and how many hours until the limit of 120 µm?',
      ],
    ],
    A5: [['hours run / h', 'clearance / µm', 'remark']],
    A6: [
      [50, 22, null],
      [120, 25, null],
      [250, 28, null],
      [400, 36, null],
      [650, 45, null],
      [900, 51, null],
      [1100, 'not read', 'motor could not be isolated'],
      [1300, 58, null],
      [1800, 66, null],
      [2400, 75, null],
      [3100, 87, null],
      [3900, 93, null],
    ],
    E6: [['Constants of the root law']],
    E7: [['=TAUT.CONSTANTS(A6:A40,B6:B40,"root")']],
    E11: [['Hours until a clearance']],
    E12: [['clearance / µm', 'hours / h', 'standard uncertainty', 'low', 'high']],
    E13: [[120, '=TAUT.X.AT(A6:A40,B6:B40,"root",E13)']],
    E15: [['Which law?']],
    E16: [['=TAUT.COMPARE(A6:A40,B6:B40)']],
    E30: [['Checks']],
    E31: [['=TAUT.CHECKS(A6:A40,B6:B40,"root")']],
  },
  styles: {
    A1: 'title',
    'A2:A3': 'note',
    'A5:C5': 'header',
    'A6:C40': 'input',
    E6: 'heading',
    'E7:I7': 'header',
    E11: 'heading',
    'E12:I12': 'header',
    E13: 'input',
    E15: 'heading',
    'E16:L16': 'header',
    E30: 'heading',
    'E31:F31': 'header',
  },
  numberFormats: { 'A6:B40': '0', 'F8:I9': '0.000', 'F13:I13': '0', 'G17:K27': '0.000' },
  followed: { typed: 'A6:B17', x: 'A6:A40', y: 'B6:B40', constants: 'E7', laws: '', more: '' },
};
