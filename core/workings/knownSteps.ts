import { derivativeByKnown } from '../constants/knownEffects.ts';
import { workingsWords } from '../words/workingsWords.ts';
import { expressionColumn } from './axisColumns.ts';
import { constantFormula, type Desk, rowFormula, sumOfProducts, whenUsed } from './desk.ts';
import { differentiate } from './differentiate.ts';
import type { LineCells } from './lineSteps.ts';
import { isNumber } from './plainExpression.ts';
import type { PlanColumn } from './sheetPlan.ts';

/** How the line's terms follow an uncertain known constant when the line is fitted anew; null where they do not. */
export interface KnownOnLine {
  readonly name: string;
  readonly slopeBy: string | null;
  readonly interceptBy: string | null;
}

/**
 * Writes how slope and intercept follow each uncertain known constant κ. The normal equations Σ w r = 0 and
 * Σ w r X = 0, differentiated by κ, are the line's own normal equations for db/dκ and da/dκ with
 * p = w (∂Y/∂κ − b ∂X/∂κ) + r ∂w/∂κ in place of w Y.
 */
export function knownSteps(desk: Desk, line: LineCells): KnownOnLine[] {
  return [...desk.uncertaintyCells.keys()].map((name) => onLine(desk, line, name));
}

function onLine(desk: Desk, line: LineCells, name: string): KnownOnLine {
  const { fit, writer } = desk;
  const { form } = fit;
  const vertical = differentiate(form.vertical.expression, name);
  const horizontal = differentiate(form.horizontal.expression, name);
  const inAxes = !isNumber(vertical, 0) || !isNumber(horizontal, 0);
  const heldBy =
    line.intercept === null || !line.held ? null : differentiate(form.interceptOf.expression, name);
  const moved = heldBy !== null && !isNumber(heldBy, 0);
  if (!inAxes && !moved) return { name, slopeBy: null, interceptBy: null };
  writer.section(workingsWords.knownEffect(name));
  if (fit.settings.spreadX.kind !== 'none') return refitted(desk, name);
  const pull = inAxes ? pullColumns(desk, line, name) : null;
  const { weight, horizontal: x } = line.columns;
  const pulled = pull === null ? '0' : `SUM(${pull.pulled.range})`;
  const turned =
    pull === null
      ? '0'
      : `(${sumOfProducts(pull.pulled, x)}${
          pull.horizontalBy === null ? '' : `+${sumOfProducts(weight, line.residual, pull.horizontalBy)}`
        })`;
  const label = (term: string): string => workingsWords.byTerm(term, name).replaceAll('∂', 'd');
  if (line.held) {
    const interceptBy = moved
      ? writer.step(
          label('intercept'),
          constantFormula(desk, heldBy),
          workingsWords.interceptByKnownHow(name),
        )
      : null;
    const less = interceptBy === null ? '' : `-${sumOfProducts(weight, x)}*${interceptBy}`;
    const slopeBy = writer.step(
      label('slope'),
      `(${turned}${less})/${line.spread}`,
      workingsWords.slopeByKnownHow(name),
    );
    return { name, slopeBy, interceptBy };
  }
  const slopeBy = writer.step(
    label('slope'),
    `(${turned}-${line.meanX}*${pulled})/${line.spread}`,
    workingsWords.slopeByKnownHow(name),
  );
  const interceptBy = writer.step(
    label('intercept'),
    `${pulled}/${line.total}-${line.meanX}*${slopeBy}`,
    workingsWords.interceptByKnownHow(name),
  );
  return { name, slopeBy, interceptBy };
}

/** Derivatives found by fitting anew, as numbers: where the slope stands in its own weights. */
function refitted({ fit, writer }: Desk, name: string): KnownOnLine {
  const effect = fit.knownEffects.find((one) => one.name === name);
  if (effect === undefined) return { name, slopeBy: null, interceptBy: null };
  const how = (term: string): string => workingsWords.refittedHow(term, name);
  return {
    name,
    slopeBy: writer.given(
      `dslope/d${name}`,
      derivativeByKnown(effect, ({ slope }) => slope),
      how('slope'),
    ),
    interceptBy: writer.given(
      `dintercept/d${name}`,
      derivativeByKnown(effect, ({ intercept }) => intercept),
      how('intercept'),
    ),
  };
}

function pullColumns(
  desk: Desk,
  line: LineCells,
  name: string,
): { readonly pulled: PlanColumn; readonly horizontalBy: PlanColumn | null } {
  const { fit, writer } = desk;
  const { law, form, settings } = fit;
  const { columns } = line;
  const by = (axis: 'X' | 'Y', expression: Parameters<typeof differentiate>[0]): PlanColumn | null =>
    expressionColumn(
      desk,
      columns,
      workingsWords.derivative(axis, name),
      workingsWords.axisByKnownHow(axis, name),
      differentiate(expression, name),
    );
  const verticalBy = by('Y', form.vertical.expression);
  const horizontalBy = by('X', form.horizontal.expression);
  // w = 1/(σ ∂Y/∂y)², so that ∂w/∂κ = −2 w (∂²Y/∂y∂κ)/(∂Y/∂y).
  const first = differentiate(form.vertical.expression, law.response);
  const second = differentiate(first, name);
  const weightBy =
    settings.spreadY.kind === 'none' || isNumber(second, 0)
      ? null
      : writer.column(workingsWords.derivative('w', name), workingsWords.weightByKnownHow(name), (_, row) => {
          const ratio = `(${rowFormula(desk, columns, second, row)})/(${rowFormula(desk, columns, first, row)})`;
          return whenUsed(columns.use, row, `-2*${columns.weight.at(row)}*${ratio}`);
        });
  const pulled = writer.column(`pull of ${name}`, workingsWords.pulledHow(name), (_, row) => {
    const parts = [
      verticalBy === null ? '' : verticalBy.at(row),
      horizontalBy === null ? '' : `-${line.slope}*${horizontalBy.at(row)}`,
    ].join('');
    const moved = parts === '' ? '' : `${columns.weight.at(row)}*(${parts})`;
    const reweighed = weightBy === null ? '' : `+${line.residual.at(row)}*${weightBy.at(row)}`;
    return whenUsed(columns.use, row, `${moved}${reweighed}`);
  });
  return { pulled, horizontalBy };
}
