import { describe, expect, test } from '@jest/globals';
import { functionsMetadata } from '../../functions/metadata.ts';
import { functionTable } from '../../functions/table.ts';

const metadata = functionsMetadata('https://localhost:3443');
/** The functions' own arguments in order, as the contract lists them; `…` for the shared ones. */
const contract: Readonly<Record<string, string>> = {
  LINE: 'x,y,law,…',
  CONSTANTS: 'x,y,law,…',
  CONSTANT: 'x,y,law,name,[part],…',
  STRAIGHTNESS: 'x,y,law,…',
  COMPARE: 'x,y,[laws],…',
  AXES: 'x,y,law,…',
  RESIDUALS: 'x,y,law,…',
  'Y.AT': 'x,y,law,at,…',
  'X.AT': 'x,y,law,at,…',
  CHECKS: 'x,y,law,…',
  STATEMENT: 'x,y,law,name,[unit],…',
  STRAIGHTEN: 'law,[known]',
  LAWS: '',
  EACH: 'key,x,y,law,…',
  SHARE: 'key,x,y,law,…',
  NEXT: 'x,y,law,name,low,high,…',
};

describe('functions.json', () => {
  test('has every function of the contract with its arguments', () => {
    const written = metadata.functions.map(({ id, parameters }) => {
      const names = parameters.map(({ name, optional }) => (optional ? `[${name}]` : name)).join(',');
      return [id, names.replace(/\[known\],\[u_y\],\[u_x\],\[options\]$/, '…')];
    });
    expect(Object.fromEntries(written)).toEqual(contract);
    expect(written).toHaveLength(Object.keys(contract).length);
  });

  test('keeps the rules of the host', () => {
    expect(metadata.allowErrorForDataTypeAny).toBe(true);
    for (const one of metadata.functions) {
      expect(one.id).toMatch(/^[A-Z][A-Z0-9.]{2,63}$/);
      expect(one.name).toBe(one.id);
      expect(one.description.length).toBeGreaterThan(20);
      expect(one.description.length).toBeLessThanOrEqual(120);
      expect(one.helpUrl.startsWith('https://localhost:3443/')).toBe(true);
      const required = one.parameters.map(({ optional }) => optional !== true);
      expect(required).toEqual([...required].sort((a, b) => Number(b) - Number(a)));
      for (const parameter of one.parameters) {
        expect(parameter.type).toBe('any');
        expect(parameter.description.length).toBeLessThanOrEqual(120);
      }
      if (one.options?.requiresParameterAddresses) expect(one.result.dimensionality).toBe('matrix');
    }
  });
});

test('the function table has a row for each function', () => {
  const rows = functionTable().split('\n').slice(2);
  expect(rows).toHaveLength(metadata.functions.length);
  expect(rows).toContainEqual(expect.stringContaining('`TAUT.CONSTANT(x, y, law, name, [part], …)`'));
  expect(rows).toContainEqual(expect.stringContaining('`TAUT.STRAIGHTEN(law, [known])`'));
});
