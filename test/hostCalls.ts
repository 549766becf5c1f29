import { invoke } from '../functions/invoke.ts';
import { sheetFunctions } from '../functions/sheetFunctions.ts';

/** What a host gives for a column of cells. */
export type Cells = unknown[][];

/** The error that a host shows in a cell. */
export class HostError extends Error {
  readonly code: string;
  constructor(code: string, message = '') {
    super(message);
    this.code = code;
  }
}

/** Puts the global in place that a host gives an add-in's page. */
export function supplyHost(): void {
  Reflect.set(globalThis, 'CustomFunctions', {
    Error: HostError,
    ErrorCode: {
      invalidValue: '#VALUE!',
      notAvailable: '#N/A',
      divisionByZero: '#DIV/0!',
      invalidNumber: '#NUM!',
      nullReference: '#NULL!',
    },
  });
}

/** A sheet function as the host calls it: arguments as cells, the answer as cells. */
export function hostFunction(id: string): (...given: unknown[]) => unknown {
  const found = sheetFunctions.find((one) => one.id === id);
  if (!found) throw new Error(`there is no function ${id}`);
  return (...given) => invoke(found, given);
}
