import { runInNewContext } from 'node:vm';

/** The parts of functions.json that the build reads. */
export interface SheetFunction {
  readonly id: string;
  readonly name: string;
  readonly description: string;
  readonly helpUrl: string;
  readonly parameters: readonly SheetParameter[];
  readonly result: { readonly type?: string; readonly dimensionality?: string };
  readonly options?: { readonly requiresParameterAddresses?: boolean };
}

export interface SheetParameter {
  readonly name: string;
  readonly description: string;
  readonly type: string;
  readonly dimensionality: string;
  readonly optional?: boolean;
  readonly repeating?: boolean;
}

/** Ids and names as the project's contract allows them: within what the host takes. */
const ID = /^[A-Z][A-Z0-9.]{2,63}$/;

/** Reads the functions out of functions.json. @throws SyntaxError when it is not JSON */
export function readFunctions(json: string): readonly SheetFunction[] {
  // The shape is what `faultsOfFunctions` checks before anything relies on it.
  const { functions } = JSON.parse(json) as { functions?: readonly SheetFunction[] };
  return functions ?? [];
}

/**
 * What a host would stumble over in functions.json: one sentence for each fault.
 *
 * @param json text of functions.json
 * @param origin address that every helpUrl must start with
 */
export function faultsOfFunctions(json: string, origin: string): string[] {
  const functions = readFunctions(json);
  const faults: string[] = [];
  if (functions.length === 0) faults.push('there are no functions');
  if (!/"allowErrorForDataTypeAny": true/.test(json)) faults.push('allowErrorForDataTypeAny is not set');
  if (json.includes('allowCustomDataForDataTypeAny')) faults.push('allowCustomDataForDataTypeAny is set');
  const ids = new Set<string>();
  for (const declared of functions) {
    const { id, name, description, helpUrl, parameters, result, options } = declared;
    const say = (what: string) => faults.push(`${id}: ${what}`);
    if (!ID.test(id) || id !== name) say('id and name must be the same word of capitals, digits and dots');
    if (ids.has(id)) say('is declared twice');
    ids.add(id);
    if (!description) say('has no description');
    if (!helpUrl?.startsWith(`${origin}/functions.html#`)) say(`has the helpUrl ${helpUrl}`);
    if (options?.requiresParameterAddresses && result.dimensionality !== 'matrix') {
      say('asks for parameter addresses, for which the result must be a matrix');
    }
    parameters.forEach((parameter, place) => {
      const whose = `parameter ${parameter.name}`;
      if (parameter.type !== 'any') say(`${whose} has the type ${parameter.type}`);
      if (!['scalar', 'matrix'].includes(parameter.dimensionality)) say(`${whose} has no dimensionality`);
      if (!parameter.description) say(`${whose} has no description`);
      if (parameter.repeating && place < parameters.length - 1) say(`${whose} repeats but is not the last`);
      const before = parameters[place - 1];
      if (before?.optional && !parameter.optional) say(`${whose} is required after an optional one`);
    });
  }
  return faults;
}

/**
 * Runs functions.js as a host would load it, with nothing but a `CustomFunctions` that cannot make errors yet,
 * and returns the ids that it registers.
 */
export function registeredIds(script: string): string[] {
  const ids: string[] = [];
  const associate = (id: unknown, compute: unknown) => {
    if (typeof compute !== 'function')
      throw new Error(`functions.js registers ${String(id)} without a function`);
    ids.push(String(id));
  };
  runInNewContext(script, { CustomFunctions: { associate } }, { filename: 'functions.js' });
  return ids;
}
