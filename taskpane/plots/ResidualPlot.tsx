import { useCallback, useMemo } from 'preact/hooks';
import { plotWords } from '../../core/words/plotWords.ts';
import { drawResidual } from './drawResidual.ts';
import { Figure } from './Figure.tsx';
import { residualName } from './names.ts';
import { residualPoints } from './points.ts';
import type { PlotProps } from './StraightPlot.tsx';
import { residualHeight, sharedRoom } from './sharedRoom.ts';

/** What the line leaves, on the same horizontal axis as the straight plot. */
export function ResidualPlot({ fit, xTitle, yTitle, selected, onSelect }: PlotProps) {
  const title = plotWords.residualAxis(yTitle);
  const draw = useCallback(
    (width: number) =>
      drawResidual(fit, {
        width,
        height: residualHeight(width),
        marginLeft: sharedRoom(fit, width),
        xTitle,
        yTitle: title,
      }),
    [fit, xTitle, title],
  );
  const points = residualPoints(fit);
  const name = useMemo(() => plotWords.residual(residualName(fit)), [fit]);
  return <Figure draw={draw} name={name} points={points} selected={selected} onSelect={onSelect} />;
}
