import type { SheetFunction } from './sheetFunction.ts';
import { sheetFunctions } from './sheetFunctions.ts';

/** A function as it is typed: `TAUT.CONSTANT(x, y, law, name, [part], …)`; the shared arguments are left to the dots. */
export function signature({ id, parameters }: SheetFunction): string {
  const fits = parameters.some(({ name }) => name === 'u_y');
  const own = fits ? parameters.filter(({ name }) => !sharedNames.has(name)) : parameters;
  const names = own.map(({ name, optional }) => (optional ? `[${name}]` : name));
  return `TAUT.${id}(${[...names, ...(fits ? ['…'] : [])].join(', ')})`;
}

const sharedNames: ReadonlySet<string> = new Set(['known', 'u_y', 'u_x', 'options']);

/** The README's function table, in Markdown. */
export function functionTable(): string {
  const rows = sheetFunctions.map(
    (one) => `| \`${signature(one)}\` | ${one.description.replaceAll('|', '\\|')} |`,
  );
  return ['| function | what it returns |', '| --- | --- |', ...rows].join('\n');
}
