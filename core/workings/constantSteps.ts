import { singleTermOf, type TermsInUse, termsInUse } from '../constants/usedTerms.ts';
import type { Fit } from '../fit/fit.ts';
import { workingsWords } from '../words/workingsWords.ts';
import { type ClosedForm, closedForms, INTERCEPT, SLOPE } from './closedForm.ts';
import { carriedEnds, plainEnds } from './constantEnds.ts';
import { refittedDerivative, totalDerivative, uncertaintyStep } from './constantUncertainty.ts';
import { constantFormula, type Desk } from './desk.ts';
import { type Follows, followSteps } from './followSteps.ts';
import type { KnownOnLine } from './knownSteps.ts';
import type { LineCells } from './lineSteps.ts';
import { termFormula, termText } from './termFormula.ts';

/** Cells of one constant of the law. */
export interface ConstantCells {
  readonly name: string;
  readonly value: string;
  readonly standardUncertainty: string | null;
  readonly low: string | null;
  readonly high: string | null;
  /** True when the interval is that of a line term carried through. */
  readonly carried: boolean;
}

/** Writes the law's constants from the line: values, standard uncertainties, intervals. */
export function constantSteps(
  desk: Desk,
  line: LineCells,
  known: readonly KnownOnLine[],
  factor: string | null,
): ConstantCells[] {
  const { fit, writer } = desk;
  const { law, form } = fit;
  writer.section(workingsWords.constants());
  const terms = termsInUse(form, fit.settings.options.intercept === 'held');
  const names = law.unknown.filter((name) => form.inSlope.includes(name) || form.inIntercept.includes(name));
  const forms = terms === 'combined' ? null : closedFormsOf(fit, terms, names);
  if (forms === null) {
    for (const name of names) {
      const how = terms === 'combined' ? workingsWords.combinedHow(name) : workingsWords.startHow(name);
      desk.constantCells.set(name, writer.given(name, settledValue(fit, name), how));
    }
  } else {
    for (const { name, expression } of forms) {
      const formula = termFormula(desk, expression, line.slope, line.intercept ?? '0');
      desk.constantCells.set(
        name,
        writer.step(name, formula, workingsWords.solvedHow(name, termText(expression))),
      );
    }
  }
  const follows = followSteps(desk, line, terms, names);
  if (forms === null) stepOnce(desk, line, names, follows);
  return names.map((name) => {
    const value = desk.constantCells.get(name) ?? '';
    const by = follows.get(name) ?? { slope: null, intercept: null };
    if (factor === null || line.varianceSlope === null) {
      return { name, value, standardUncertainty: null, low: null, high: null, carried: false };
    }
    const total =
      terms === 'combined'
        ? (one: KnownOnLine) => refittedDerivative(desk, one.name, name)
        : (one: KnownOnLine) => totalDerivative(desk, one, name, by);
    const standardUncertainty = uncertaintyStep(desk, line, known, name, by, total);
    const term = fit.knownEffects.length > 0 ? null : singleTermOf(form, terms, name);
    const closed = forms?.find((one) => one.name === name);
    if (term === null || closed === undefined) {
      const ends = plainEnds(desk, name, value, standardUncertainty, factor);
      return { name, value, standardUncertainty, ...ends, carried: false };
    }
    const ends = carriedEnds(desk, line, closed, term, factor);
    return { name, value, standardUncertainty, ...ends, carried: true };
  });
}

function settledValue({ law, values }: Fit, name: string): number {
  return values[law.constants.indexOf(name)] ?? Number.NaN;
}

function closedFormsOf(fit: Fit, terms: TermsInUse, names: readonly string[]): readonly ClosedForm[] | null {
  const { law, form, line, values } = fit;
  const all = new Map(law.constants.map((name, k) => [name, values[k] ?? Number.NaN]));
  all.set(SLOPE, line.slope);
  all.set(INTERCEPT, line.intercept);
  return closedForms(
    {
      slope: terms === 'intercept' ? null : form.slopeOf.expression,
      intercept: terms === 'slope' ? null : form.interceptOf.expression,
    },
    names,
    all,
  );
}

/** One Newton step from the stated values: next to nothing while the readings are those that they were settled with. */
function stepOnce(
  desk: Desk,
  line: LineCells,
  names: readonly string[],
  follows: ReadonlyMap<string, Follows>,
): void {
  const { fit, writer } = desk;
  const { form } = fit;
  const slopeLeft = `(${line.slope}-(${constantFormula(desk, form.slopeOf.expression)}))`;
  const interceptLeft = `(${line.intercept ?? '0'}-(${constantFormula(desk, form.interceptOf.expression)}))`;
  const stepped = names.map((name) => {
    const by = follows.get(name);
    const parts = [
      by?.slope ? `${by.slope}*${slopeLeft}` : '',
      by?.intercept ? `${by.intercept}*${interceptLeft}` : '',
    ].filter((part) => part !== '');
    const step = writer.step(workingsWords.stepTo(name), parts.join('+'), workingsWords.stepHow());
    const start = desk.constantCells.get(name) ?? '';
    return [name, writer.step(name, `${start}+${step}`, workingsWords.steppedHow(name))] as const;
  });
  for (const [name, cell] of stepped) desk.constantCells.set(name, cell);
}
