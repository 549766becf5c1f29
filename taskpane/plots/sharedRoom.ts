import type { Fit } from '../../core/fit/fit.ts';
import { residualView } from './drawResidual.ts';
import { straightView } from './drawStraight.ts';
import { leftRoom } from './frame.ts';

/** A plot's height for its width: a calm landscape, never taller than the panel is wide. */
export function heightFor(width: number): number {
  return Math.round(Math.min(340, Math.max(200, width * 0.62)));
}

/** Height of the residuals below it. */
export function residualHeight(width: number): number {
  return Math.round(Math.min(200, width * 0.42));
}

/** Room on the left that the straight plot and the residuals below it share, so that a reading stands below itself. */
export function sharedRoom(fit: Fit, width: number): number {
  return Math.max(
    leftRoom(straightView(fit).y, heightFor(width)),
    leftRoom(residualView(fit).y, residualHeight(width)),
  );
}
