import { carbon } from './carbon.ts';
import { chlorine } from './chlorine.ts';
import { chlorineWithFloor } from './chlorineWithFloor.ts';
import type { DemoSheet } from './demoSheet.ts';
import { pump } from './pump.ts';
import { thermistor } from './thermistor.ts';
import { weir } from './weir.ts';

/**
 * The demo workbook: a season's readings of the laboratory and field crew of Ellowmere Water, a utility that exists
 * nowhere but here. Every number was invented: a law, constants, and a scatter such as a real crew would have.
 */
export const demoWorkbook: readonly DemoSheet[] = [
  chlorine,
  chlorineWithFloor,
  weir,
  thermistor,
  carbon,
  pump,
];
