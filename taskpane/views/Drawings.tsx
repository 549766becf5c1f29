import { useMemo } from 'preact/hooks';
import type { Fit } from '../../core/fit/fit.ts';
import { depthWords } from '../../core/words/panelWords.ts';
import { CurvePlot } from '../plots/CurvePlot.tsx';
import { ResidualPlot } from '../plots/ResidualPlot.tsx';
import { StraightPlot } from '../plots/StraightPlot.tsx';
import type { Heading } from '../state/choice.ts';
import { headingText } from '../state/heading.ts';
import { useChoice, usePart, useSession } from './context.ts';
import { percent } from './figures.ts';
import { Part } from './parts.tsx';

/** Readings and line on the straight axes, with what the line leaves underneath. */
export function StraightView(props: { readonly fit: Fit }) {
  const session = useSession();
  const selected = usePart((state) => state.picked);
  const { xHeading, yHeading } = useChoice();
  const { fit } = props;
  const xTitle = straightTitle(fit, fit.form.against, xHeading, yHeading);
  const yTitle = straightTitle(fit, fit.form.plot, xHeading, yHeading);
  const plots = useMemo(() => {
    const shared = {
      fit,
      xTitle,
      yTitle,
      selected,
      onSelect: session.pick,
    };
    return { straight: <StraightPlot {...shared} />, residual: <ResidualPlot {...shared} /> };
  }, [fit, selected, session, xTitle, yTitle]);
  return (
    <>
      <Part title={depthWords.straightTitle} kind="drawing">
        {plots.straight}
      </Part>
      <Part title={depthWords.residualTitle} kind="drawing">
        {plots.residual}
      </Part>
    </>
  );
}

/** An axis that is a quantity of the sheet as it is carries its name and unit; any other the law's own text. */
function straightTitle(fit: Fit, axis: string, xHeading: Heading, yHeading: Heading): string {
  if (axis === fit.law.predictor) return headingText(xHeading);
  return axis === fit.law.response ? headingText(yHeading) : axis;
}

/** Readings and curve on the axes of the sheet, with the coverage band. */
export function CurveView(props: { readonly fit: Fit }) {
  const session = useSession();
  const selected = usePart((state) => state.picked);
  const { xHeading, yHeading } = useChoice();
  const { fit } = props;
  const { band, coverage } = fit.settings.options;
  const [xTitle, yTitle] = [headingText(xHeading), headingText(yHeading)];
  const plot = useMemo(
    () => (
      <CurvePlot
        fit={fit}
        band={band}
        selected={selected}
        onSelect={session.pick}
        xTitle={xTitle}
        yTitle={yTitle}
      />
    ),
    [fit, band, selected, session, xTitle, yTitle],
  );
  return (
    <Part title={depthWords.curveTitle} kind="drawing">
      {plot}
      <p class="hint">{depthWords.bandNote(percent(coverage), band)}</p>
    </Part>
  );
}
