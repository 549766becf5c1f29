import { useCallback, useId, useMemo, useState } from 'preact/hooks';
import { plotWords } from '../../core/words/plotWords.ts';
import { drawCurve, spansDecades } from './drawCurve.ts';
import { Figure } from './Figure.tsx';
import { sheetPoints } from './points.ts';
import type { PlotProps } from './StraightPlot.tsx';
import { heightFor } from './sharedRoom.ts';

export interface CurvePlotProps extends PlotProps {
  readonly band: 'curve' | 'reading';
}

/** Readings, curve and coverage band on the axes of the sheet; logarithmic upwards over decades, unless unwanted. */
export function CurvePlot({ fit, band, xTitle, yTitle, selected, onSelect }: CurvePlotProps) {
  const [wanted, setWanted] = useState(true);
  const id = useId();
  const offered = useMemo(() => spansDecades(fit), [fit]);
  const logarithmic = offered && wanted;
  const draw = useCallback(
    (width: number) => drawCurve(fit, { width, height: heightFor(width), xTitle, yTitle }, logarithmic),
    [fit, xTitle, yTitle, logarithmic],
  );
  const points = sheetPoints(fit).all;
  const name = plotWords.curve(points.length, fit.law.equation, fit.coverage.probability, band);
  return (
    <>
      <Figure draw={draw} name={name} points={points} selected={selected} onSelect={onSelect} />
      {offered && (
        <label class="check" for={id}>
          <input
            id={id}
            type="checkbox"
            checked={wanted}
            onChange={(event) => setWanted(event.currentTarget.checked)}
          />
          {plotWords.logarithmic}
        </label>
      )}
    </>
  );
}
