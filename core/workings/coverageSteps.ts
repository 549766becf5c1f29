import { workingsWords } from '../words/workingsWords.ts';
import type { Desk } from './desk.ts';

/**
 * Writes the coverage factor. The inverse of Student's distribution stops after about nine digits in some spreadsheets,
 * so the distribution is written out at its result and one Newton step taken.
 * @returns its cell; null without degrees of freedom
 * @see Abramowitz & Stegun (1964), Handbook of Mathematical Functions, 26.7.3 and 26.7.4
 */
export function coverageSteps({ fit, writer, coverage }: Desk, freedom: string): string | null {
  if (Number.isNaN(fit.coverage.factor)) return null;
  if (fit.coverage.distribution === 'normal') {
    return writer.step(
      workingsWords.factor(),
      `NORM.S.INV((1+${coverage})/2)`,
      workingsWords.factorNormalHow(),
    );
  }
  const start = writer.step(
    workingsWords.factorStart(),
    `T.INV.2T(1-${coverage},${freedom})`,
    workingsWords.factorStudentHow(),
  );
  const angle = writer.step('θ', `ATAN(${start}/SQRT(${freedom}))`, workingsWords.angleHow());
  const odd = `MOD(${freedom},2)`;
  // 1 or cos θ first; each further term is (2j − 1)/(2j) or 2j/(2j + 1) times cos² θ of the one before.
  const terms = writer.column(workingsWords.studentTerms(), workingsWords.studentTermsHow(), (j, row) => {
    const before = `$${writer.nextColumn()}${row}`;
    const term =
      j === 0 ? `COS(${angle})^${odd}` : `${before}*(${2 * j - 1}+${odd})/(${2 * j}+${odd})*COS(${angle})^2`;
    return `IF(${2 * j + 2}+${odd}>${freedom},0,${term})`;
  });
  const within = writer.step(
    workingsWords.studentWithin(),
    `IF(${odd}=0,SIN(${angle})*SUM(${terms.range}),2/PI()*(${angle}+SIN(${angle})*SUM(${terms.range})))`,
    workingsWords.studentWithinHow(),
  );
  return writer.step(
    workingsWords.factor(),
    `${start}-(${within}-${coverage})/(2*T.DIST(${start},${freedom},FALSE))`,
    workingsWords.factorPolishHow(),
  );
}
