import { join } from 'node:path';
import { createContext, runInContext } from 'node:vm';
import { buildSync } from 'esbuild';

/** An error in a cell as the host makes it. */
export interface HostError {
  readonly code: string;
  readonly message: string;
}

export interface LoadedFunctions {
  readonly ids: readonly string[];
  /** Calls a function as the host does: the arguments, then an invocation object. */
  call(id: string, ...given: unknown[]): unknown;
  /** Calls a function with the addresses of its arguments. */
  callFrom(addresses: readonly string[], id: string, ...given: unknown[]): unknown;
  /** The error that a call throws. @throws when it throws none */
  refusal(id: string, ...given: unknown[]): HostError;
  isError(value: unknown): value is HostError;
  error(code: string, message?: string): HostError;
  /** What the page shows under a global name. */
  setGlobal(name: string, value: unknown): void;
}

let script: string | undefined;

function bundled(): string {
  script ??= buildSync({
    entryPoints: [join(process.cwd(), 'functions', 'main.ts')],
    bundle: true,
    write: false,
    format: 'iife',
    target: 'es2022',
    logLevel: 'error',
  }).outputFiles[0]?.text;
  if (script === undefined) throw new Error('the bundler wrote nothing');
  return script;
}

/** Loads the sheet functions as a host does: `CustomFunctions.Error` and `ErrorCode` come only after the script. */
export function loadFunctions(): LoadedFunctions {
  const functions = new Map<string, (...given: unknown[]) => unknown>();
  class HostErrorClass extends Error {
    constructor(
      readonly code: string,
      message = '',
    ) {
      super(message);
    }
  }
  const customFunctions: Record<string, unknown> = {
    associate(id: string, implementation: (...given: unknown[]) => unknown) {
      if (functions.has(id)) throw new Error(`${id} is associated twice`);
      functions.set(id, implementation);
    },
  };
  const page = createContext({ CustomFunctions: customFunctions });
  runInContext(bundled(), page);
  customFunctions['Error'] = HostErrorClass;
  customFunctions['ErrorCode'] = {
    invalidValue: '#VALUE!',
    notAvailable: '#N/A',
    divisionByZero: '#DIV/0!',
    invalidNumber: '#NUM!',
    nullReference: '#NULL!',
    invalidName: '#NAME?',
    invalidReference: '#REF!',
  };
  const callFrom = (addresses: readonly string[], id: string, ...given: unknown[]): unknown => {
    const implementation = functions.get(id);
    if (implementation === undefined) throw new Error(`${id} is not associated`);
    return implementation(...given, {
      functionName: id,
      address: 'Sheet1!Z1',
      parameterAddresses: addresses,
    });
  };
  const call = (id: string, ...given: unknown[]): unknown => callFrom([], id, ...given);
  return {
    ids: [...functions.keys()],
    call,
    callFrom,
    refusal(id, ...given) {
      let result: unknown;
      try {
        result = call(id, ...given);
      } catch (error) {
        if (error instanceof HostErrorClass) return error;
        throw error;
      }
      throw new Error(`${id} returned ${JSON.stringify(result)}`);
    },
    isError: (value): value is HostError => value instanceof HostErrorClass,
    error: (code, message) => new HostErrorClass(code, message),
    setGlobal(name, value) {
      page[name] = value;
    },
  };
}
