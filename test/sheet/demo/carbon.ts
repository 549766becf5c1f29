import type { DemoSheet } from './demoSheet.ts';

/** Geosmin surrogate on activated carbon: Langmuir, 182 mg/g, 0.38 L/mg, scatter 1.8 %. */
export const carbon: DemoSheet = {
  name: 'Carbon',
  columnWidths: [84, 104, 150, 20, 130, 150, 178, 90, 90, 84, 84, 260],
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
    E6: [['Constants of the isotherm, scatter 2 % of q']],
    E7: [['=TAUT.CONSTANTS(A6:A40,B6:B40,"langmuir",,"2%")']],
    E11: [['In a sentence']],
    E12: [['=TAUT.STATEMENT(A6:A40,B6:B40,"langmuir","qm","mg/g",,"2%")']],
    E14: [['Which isotherm?']],
    E15: [['=TAUT.COMPARE(A6:A40,B6:B40,"langmuir; freundlich; logarithmic",,"2%")']],
    E21: [['Checks']],
    E22: [['=TAUT.CHECKS(A6:A40,B6:B40,"langmuir",,"2%")']],
  },
  styles: {
    A1: 'title',
    'A2:A3': 'note',
    'A5:C5': 'header',
    'A6:C40': 'input',
    E6: 'heading',
    'E7:I7': 'header',
    E11: 'heading',
    E12: 'statement',
    E14: 'heading',
    'E15:L15': 'header',
    E21: 'heading',
    'E22:F22': 'header',
  },
  numberFormats: { 'A6:B40': '0.0', 'F8:I9': '0.000', 'G16:K18': '0.000' },
  followed: {
    typed: 'A6:B16',
    x: 'A6:A40',
    y: 'B6:B40',
    constants: 'E7',
    laws: 'langmuir; freundlich; logarithmic',
    more: ',,"2%"',
  },
};
