import { useCallback, useMemo } from 'preact/hooks';
import type { Fit } from '../../core/fit/fit.ts';
import { plotWords } from '../../core/words/plotWords.ts';
import { drawStraight } from './drawStraight.ts';
import { Figure } from './Figure.tsx';
import { straightName } from './names.ts';
import { straightPoints } from './points.ts';
import { heightFor, sharedRoom } from './sharedRoom.ts';

export interface PlotProps {
  readonly fit: Fit;
  readonly xTitle: string;
  readonly yTitle: string;
  readonly selected: number | null;
  readonly onSelect: (position: number | null) => void;
}

/** Readings and the taut line on the straight axes. */
export function StraightPlot({ fit, xTitle, yTitle, selected, onSelect }: PlotProps) {
  const draw = useCallback(
    (width: number) =>
      drawStraight(fit, {
        width,
        height: heightFor(width),
        marginLeft: sharedRoom(fit, width),
        xTitle,
        yTitle,
      }),
    [fit, xTitle, yTitle],
  );
  const points = straightPoints(fit);
  const name = useMemo(() => plotWords.straight(straightName(fit)), [fit]);
  return <Figure draw={draw} name={name} points={points} selected={selected} onSelect={onSelect} />;
}
