import { invoke } from './invoke.ts';
import { sheetFunctions } from './sheetFunctions.ts';

for (const sheetFunction of sheetFunctions) {
  CustomFunctions.associate(sheetFunction.id, (...given: unknown[]) => invoke(sheetFunction, given));
}
