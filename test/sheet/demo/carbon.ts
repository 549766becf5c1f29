import type { DemoSheet } from './demoSheet.ts';

/** Geosmin surrogate on activated carbon: Langmuir, 182 mg/g, 0.38 L/mg, scatter 1.8 %. */
export const carbon: DemoSheet = {
  name: 'Carbon',
  columnWidths: [92, 104, 190, 24, 150, 110, 130, 96, 96, 84, 84, 260],
  frozenRows: 5,
  blocks: {
    A1: [['Activated carbon, jar test isotherm']],
    A2: [
      [
        'Ellowmere Water, laboratory. Ten jars, three days on the shaker, filtered; c is what is left in the water.',
      ],
    ],
    A3: [
      [
        'Wanted by the process engineer: the most that a gram of the new carbon holds, and whether it levels off at all.',
      ],
    ],
    A5: [['c / (mg/L)', 'q / (mg/g)', 'remark']],
    A6: [
      [0.3, 19.2, null],
      [0.6, 34.6, null],
      [1.1, 53.4, null],
      [1.9, 74.4, null],
      [3.2, 99.1, null],
      [4.1, 'n/a', 'filter burst'],
      [5, 116.5, null],
      [8.1, 136.5, null],
      [12.4, 147.5, null],
      [18.7, 158.2, null],
      [27, 160.5, null],
    ],
    E5: [['Constants of the isotherm, scatter 2 % of q']],
    E6: [['=TAUT.CONSTANTS(A6:A40,B6:B40,"langmuir",,"2%")']],
    E10: [['In a sentence']],
    E11: [['=TAUT.STATEMENT(A6:A40,B6:B40,"langmuir","qm","mg/g",,"2%")']],
    E13: [['Which isotherm?']],
    E14: [['=TAUT.COMPARE(A6:A40,B6:B40,"langmuir; freundlich; logarithmic",,"2%")']],
    E20: [['Checks']],
    E21: [['=TAUT.CHECKS(A6:A40,B6:B40,"langmuir",,"2%")']],
  },
  styles: {
    A1: 'title',
    'A2:A3': 'note',
    'A5:C5': 'header',
    'A6:C40': 'input',
    E5: 'heading',
    'E6:I6': 'header',
    E10: 'heading',
    E11: 'statement',
    E13: 'heading',
    'E14:L14': 'header',
    E20: 'heading',
    'E21:F21': 'header',
  },
  numberFormats: { 'A6:B40': '0.0', 'F7:I8': '0.000', 'G15:K17': '0.000' },
  followed: {
    typed: 'A6:B16',
    x: 'A6:A40',
    y: 'B6:B40',
    constants: 'E6',
    laws: 'langmuir; freundlich; logarithmic',
    more: ',,"2%"',
  },
};
