import { countCells } from '../core/readings/cellWalk.ts';
import { askBlankPairs, hasDoubtfulZero } from './blankPairs.ts';
import { Call } from './call.ts';
import type { SheetFunction } from './sheetFunction.ts';
import { type HostCell, thrownToHost, toHostCell, toHostTable } from './toHost.ts';

export type HostResult = HostCell | HostCell[][];

/** Whether a function's answer gains from asking the host which cells are blank; only tables may know addresses. */
export function wantsAddresses({ result, parameters }: SheetFunction): boolean {
  return result === 'matrix' && parameters.some(({ name }) => name === 'x');
}

/** Addresses of x and y, where the host passed them. */
function addressesOf(
  { parameters }: SheetFunction,
  given: readonly unknown[],
): [string | undefined, string | undefined] {
  // The host's last argument; every part of it is checked before use.
  const invocation = given[given.length - 1] as { parameterAddresses?: unknown } | null | undefined;
  const addresses: unknown[] = Array.isArray(invocation?.parameterAddresses)
    ? invocation.parameterAddresses
    : [];
  const addressOf = (wanted: string): string | undefined => {
    const address = addresses[parameters.findIndex(({ name }) => name === wanted)];
    return typeof address === 'string' ? address : undefined;
  };
  return [addressOf('x'), addressOf('y')];
}

function answer(sheetFunction: SheetFunction, call: Call): HostResult {
  return sheetFunction.result === 'matrix'
    ? toHostTable(sheetFunction.compute(call))
    : toHostCell(sheetFunction.compute(call));
}

/**
 * Runs a sheet function on what the host passed.
 * @returns legal cells; a promise of them only where the host must first be asked which cells are blank
 * @throws CustomFunctions.Error, never anything else
 */
export function invoke(
  sheetFunction: SheetFunction,
  given: readonly unknown[],
): HostResult | Promise<HostResult> {
  try {
    const call = new Call(sheetFunction.parameters, given);
    if (wantsAddresses(sheetFunction)) {
      const addresses = addressesOf(sheetFunction, given);
      if (addresses.every((address) => address !== undefined) && hasDoubtfulZero(call)) {
        return askBlankPairs(addresses, countCells(call.raw('x')))
          .then((blankPairs) => {
            call.blankPairs = blankPairs;
            return answer(sheetFunction, call);
          })
          .catch((thrown: unknown) => {
            throw thrownToHost(thrown, sheetFunction.id);
          });
      }
    }
    return answer(sheetFunction, call);
  } catch (thrown) {
    throw thrownToHost(thrown, sheetFunction.id);
  }
}
