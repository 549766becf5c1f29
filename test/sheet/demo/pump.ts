import type { DemoSheet } from './demoSheet.ts';

/** Wear ring clearance of a well pump: 9 µm + 1.36 µm √(t/h), scatter 1.3 µm, read with feelers to 1 µm. */
export const pump: DemoSheet = {
  name: 'Pump',
  columnWidths: [104, 118, 190, 24, 150, 110, 130, 96, 96, 84, 84, 260],
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
    E5: [['Constants of the root law']],
    E6: [['=TAUT.CONSTANTS(A6:A40,B6:B40,"root")']],
    E10: [['Hours until a clearance']],
    E11: [['clearance / µm', 'hours / h', 'standard uncertainty', 'low', 'high']],
    E12: [[120, '=TAUT.X.AT(A6:A40,B6:B40,"root",E12)']],
    E14: [['Which law?']],
    E15: [['=TAUT.COMPARE(A6:A40,B6:B40)']],
    E29: [['Checks']],
    E30: [['=TAUT.CHECKS(A6:A40,B6:B40,"root")']],
  },
  styles: {
    A1: 'title',
    'A2:A3': 'note',
    'A5:C5': 'header',
    'A6:C40': 'input',
    E5: 'heading',
    'E6:I6': 'header',
    E10: 'heading',
    'E11:I11': 'header',
    E12: 'input',
    E14: 'heading',
    'E15:L15': 'header',
    E29: 'heading',
    'E30:F30': 'header',
  },
  numberFormats: { 'A6:B40': '0', 'F7:I8': '0.000', 'F12:I12': '0', 'G16:K26': '0.000' },
  followed: { typed: 'A6:B17', x: 'A6:A40', y: 'B6:B40', constants: 'E6', laws: '', more: '' },
};
