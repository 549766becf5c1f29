import { type CellErrorText, type CellValue, isCellError } from './cell.ts';
import type { CallArgument, CallPlace, CallResult, Grid } from './grid.ts';

/** How the host hands a blank cell over: as 0 (older hosts) or as null (newer ones). */
export type BlankMode = 'zero' | 'null';

/** The part of functions.json that calling a function needs. */
export interface FunctionsMetadata {
  readonly functions: readonly FunctionMetadata[];
}

export interface FunctionMetadata {
  readonly id: string;
  readonly name?: string;
  readonly description?: string;
  readonly parameters?: readonly {
    readonly name: string;
    readonly description?: string;
    readonly dimensionality?: 'scalar' | 'matrix';
    readonly optional?: boolean;
    readonly repeating?: boolean;
  }[];
  readonly result?: { readonly dimensionality?: 'scalar' | 'matrix' };
  readonly options?: { readonly requiresAddress?: boolean; readonly requiresParameterAddresses?: boolean };
}

/** The `CustomFunctions` global that a host gives an add-in's page. */
export interface CustomFunctionsGlobal {
  associate(id: string | Readonly<Record<string, HostFunction>>, implementation?: HostFunction): void;
  Error?: HostErrorClass;
  ErrorCode?: Readonly<Record<string, CellErrorText>>;
}

// The host's functions take and return whatever the add-in declared: only the add-in knows.
type HostFunction = (...values: unknown[]) => unknown;
type HostErrorClass = new (code: CellErrorText, message?: string) => Error & { readonly code: CellErrorText };

const ERROR_CODES: Readonly<Record<string, CellErrorText>> = {
  invalidValue: '#VALUE!',
  notAvailable: '#N/A',
  divisionByZero: '#DIV/0!',
  invalidNumber: '#NUM!',
  nullReference: '#NULL!',
  invalidName: '#NAME?',
  invalidReference: '#REF!',
};

/** Only these two errors carry the add-in's own sentence on a host. */
const CARRIES_MESSAGE: readonly string[] = ['#VALUE!', '#N/A'];

/**
 * Makes a `CustomFunctions` global whose associated functions calculate in a grid.
 *
 * `Error` and `ErrorCode` appear only when `revealErrors` is called, because on a host they are defined late.
 */
export function createCustomFunctions(
  grid: Grid,
  namespace: string,
  metadata: FunctionsMetadata,
  blank: BlankMode,
): { customFunctions: CustomFunctionsGlobal; revealErrors(): void } {
  class CustomFunctionError extends Error {
    readonly code: CellErrorText;
    constructor(code: CellErrorText, message?: string) {
      super(message ?? '');
      this.name = 'CustomFunctions.Error';
      this.code = code;
    }
  }
  const hostError = (cell: { error: CellErrorText; message?: string }) =>
    new CustomFunctionError(cell.error, cell.message);
  const isHostError = (value: unknown): value is CustomFunctionError =>
    typeof value === 'object' && value !== null && value instanceof CustomFunctionError;

  const declared = new Map(metadata.functions.map((one) => [one.id.toUpperCase(), one]));

  function associateOne(id: string, implementation: HostFunction): void {
    const declaration: FunctionMetadata = declared.get(id.toUpperCase()) ?? { id };
    const name = `${namespace}.${declaration.name ?? id}`.toUpperCase();
    grid.register({
      name,
      description: declaration.description ?? '',
      parameters: (declaration.parameters ?? []).map((parameter) => ({
        name: parameter.name,
        description: parameter.description ?? '',
        optional: parameter.optional ?? false,
        repeating: parameter.repeating ?? false,
      })),
      call: (given, place) => callOne(implementation, declaration, given, place),
    });
  }

  function callOne(
    implementation: HostFunction,
    declaration: FunctionMetadata,
    given: readonly CallArgument[],
    place: CallPlace,
  ): CallResult | Promise<CallResult> {
    const asError = (thrown: unknown): CellValue => {
      if (isHostError(thrown)) return withMessage(thrown);
      // A host shows any other exception as #VALUE!; its text is kept here so that a defect can be seen.
      return { error: '#VALUE!', message: `not a CustomFunctions.Error: ${String(thrown)}` };
    };
    try {
      const result = implementation(...handOver(declaration, given, place));
      if (!(typeof result === 'object' && result !== null && 'then' in result)) return takeBack(result);
      // A promise of the add-in's own realm: anything with `then`.
      return Promise.resolve(result as PromiseLike<unknown>).then(takeBack, asError);
    } catch (thrown) {
      return asError(thrown);
    }
  }

  function handOver(
    declaration: FunctionMetadata,
    given: readonly CallArgument[],
    place: CallPlace,
  ): unknown[] {
    const parameters = declaration.parameters;
    const toHost = (value: CellValue, fromCell: boolean): unknown => {
      if (value === null) return fromCell && blank === 'zero' ? 0 : null;
      return isCellError(value) ? hostError(value) : value;
    };
    const one = (
      argument: CallArgument | undefined,
      dimensionality: 'scalar' | 'matrix' | undefined,
    ): unknown => {
      if (argument === undefined) return null;
      if (argument.kind === 'matrix') {
        const matrix = argument.values.map((row) => row.map((value) => toHost(value, argument.fromCell)));
        if (dimensionality !== 'scalar') return matrix;
        if (matrix.length === 1 && matrix[0]?.length === 1) return matrix[0][0];
        throw new CustomFunctionError('#VALUE!', 'a range was given where the function takes one cell');
      }
      if (argument.value === null && !argument.fromCell) return null;
      const value = toHost(argument.value, argument.fromCell);
      return dimensionality === 'matrix' ? [[value]] : value;
    };
    const values: unknown[] = [];
    if (parameters === undefined) {
      for (const argument of given) values.push(one(argument, undefined));
    } else {
      parameters.forEach((parameter, index) => {
        if (!parameter.repeating) values.push(one(given[index], parameter.dimensionality ?? 'scalar'));
        else
          values.push(
            given.slice(index).map((argument) => one(argument, parameter.dimensionality ?? 'scalar')),
          );
      });
    }
    const invocation: Record<string, unknown> = { functionName: declaration.id };
    if (declaration.options?.requiresAddress) invocation['address'] = place.address;
    if (declaration.options?.requiresParameterAddresses) {
      invocation['parameterAddresses'] = place.argumentAddresses;
    }
    values.push(invocation);
    return values;
  }

  function withMessage(thrown: { code: CellErrorText; message: string }): CellValue {
    const carried = thrown.message !== '' && CARRIES_MESSAGE.includes(thrown.code);
    return carried ? { error: thrown.code, message: thrown.message } : { error: thrown.code };
  }

  function takeBack(result: unknown): CallResult {
    if (!Array.isArray(result)) return cellOf(result);
    const rows = result.map((row): CellValue[] => (Array.isArray(row) ? row.map(cellOf) : [cellOf(row)]));
    const width = rows[0]?.length ?? 0;
    if (width === 0 || rows.some((row) => row.length !== width)) return { error: '#VALUE!' };
    return rows;
  }

  /** NaN, Infinity and undefined become null on their way to the host, and null shows as 0. */
  function cellOf(value: unknown): CellValue {
    if (isHostError(value)) return withMessage(value);
    if (typeof value === 'number') return Number.isFinite(value) ? value : 0;
    if (typeof value === 'string' || typeof value === 'boolean') return value;
    if (value === null || value === undefined) return 0;
    return { error: '#VALUE!', message: 'the function returned an object that is no cell value' };
  }

  const customFunctions: CustomFunctionsGlobal = {
    associate(id, implementation) {
      if (typeof id === 'string') {
        if (implementation) associateOne(id, implementation);
        return;
      }
      for (const [each, fn] of Object.entries(id)) associateOne(each, fn);
    },
  };
  return {
    customFunctions,
    revealErrors() {
      customFunctions.Error = CustomFunctionError;
      customFunctions.ErrorCode = ERROR_CODES;
    },
  };
}
