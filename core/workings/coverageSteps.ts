import { workingsWords } from '../words/workingsWords.ts';
import type { Desk } from './desk.ts';

/** Writes the coverage factor. @returns its cell; null without degrees of freedom */
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
  return writer.step(
    workingsWords.factor(),
    `${start}+(T.DIST.2T(${start},${freedom})-(1-${coverage}))/(2*T.DIST(${start},${freedom},FALSE))`,
    workingsWords.factorPolishHow(),
  );
}
