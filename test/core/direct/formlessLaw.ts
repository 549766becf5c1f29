import { columnFunction } from '../../../core/law/columnFunction.ts';
import type { Law } from '../../../core/law/law.ts';
import { parseLaw } from '../../../core/law/parseLaw.ts';

/** A law with its curve and no straight form: what remains of laws that no one or two trial constants make straight. */
export function formlessLaw(equation: string): Law {
  const parsed = parseLaw(equation);
  const symbols = [parsed.predictor, parsed.response, ...parsed.constants];
  return {
    name: '',
    equation,
    response: parsed.response,
    predictor: parsed.predictor,
    constants: parsed.constants,
    known: [],
    unknown: parsed.constants,
    symbols,
    builtIn: new Map(),
    curve: columnFunction(parsed.right, symbols),
    inverse: null,
    linearInConstants: false,
    forms: [],
    derived: [],
  };
}
