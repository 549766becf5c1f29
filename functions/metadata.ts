import { wantsAddresses } from './invoke.ts';
import { sheetFunctions } from './sheetFunctions.ts';

/** The content of `functions.json`, as the host reads it. */
export interface FunctionsMetadata {
  readonly allowErrorForDataTypeAny: true;
  readonly functions: readonly FunctionMetadata[];
}

interface FunctionMetadata {
  readonly id: string;
  readonly name: string;
  readonly description: string;
  readonly helpUrl: string;
  readonly parameters: readonly {
    readonly name: string;
    readonly description: string;
    readonly type: 'any';
    readonly dimensionality: 'scalar' | 'matrix';
    readonly optional?: true;
  }[];
  readonly result: { readonly type: 'any'; readonly dimensionality: 'scalar' | 'matrix' };
  readonly options?: { readonly requiresParameterAddresses: true };
}

/**
 * The metadata of all sheet functions.
 * @param origin where the add-in is served, such as `https://localhost:3443`; help is on its page `functions.html`
 */
export function functionsMetadata(origin: string): FunctionsMetadata {
  return {
    allowErrorForDataTypeAny: true,
    functions: sheetFunctions.map((sheetFunction) => ({
      id: sheetFunction.id,
      name: sheetFunction.id,
      description: sheetFunction.description,
      helpUrl: `${origin}/functions.html#${sheetFunction.id}`,
      parameters: sheetFunction.parameters.map(({ name, description, optional, dimensionality }) => ({
        name,
        description,
        type: 'any',
        dimensionality,
        ...(optional ? { optional } : {}),
      })),
      result: { type: 'any', dimensionality: sheetFunction.result },
      ...(wantsAddresses(sheetFunction) ? { options: { requiresParameterAddresses: true } } : {}),
    })),
  };
}
