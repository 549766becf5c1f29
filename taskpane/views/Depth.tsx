import type { Fit } from '../../core/fit/fit.ts';
import { depthWords, lawsWords } from '../../core/words/panelWords.ts';
import { Handover } from '../handover/Handover.tsx';
import { equationOf } from '../state/lawSymbols.ts';
import { problemIn, valueIn } from '../state/outcome.ts';
import type { Depth as InDepth } from '../state/panelState.ts';
import { Checks } from './Checks.tsx';
import { Constants } from './Constants.tsx';
import { useChoice, usePart, useSession } from './context.ts';
import { CurveView, StraightView } from './Drawings.tsx';
import { Guard } from './Guard.tsx';
import { Known } from './Known.tsx';
import { PlanReading } from './PlanReading.tsx';
import { Section } from './parts.tsx';
import { ReadingList } from './ReadingList.tsx';
import { ReadOff } from './ReadOff.tsx';
import { Statement } from './Statement.tsx';
import { Stopped } from './Stopped.tsx';

/** The chosen law, large: drawn, settled, checked, and handed over. */
export function Depth() {
  const { law } = useChoice();
  const depth = usePart((state) => state.depth);
  if (law === '') {
    return (
      <Section id="depth" title={depthWords.title}>
        <p class="quiet pick">{depthWords.pick}</p>
      </Section>
    );
  }
  const fit = valueIn(depth?.fit ?? null);
  const problem = problemIn(depth?.fit ?? null);
  // Until the law is fitted, the one before it stays in sight under its own name.
  const late = depth?.choice.law !== law;
  return (
    <Section id="depth" title={depthWords.title}>
      {late && <p class="late">{depthWords.fitting(law)}</p>}
      {depth !== null && <LawTitle law={depth.choice.law} fit={fit} />}
      {problem !== undefined && <Stopped problem={problem} />}
      {fit !== undefined && depth !== null && <Settled fit={fit} depth={depth} />}
      {fit === undefined && depth !== null && <Known depth={depth} />}
    </Section>
  );
}

function LawTitle(props: { readonly law: string; readonly fit: Fit | undefined }) {
  const { law, fit } = props;
  const equation = fit?.law.equation ?? equationOf(law);
  return (
    <div class="law-title">
      {equation !== law && <p class="law-name">{law}</p>}
      <p class="equation math">{equation}</p>
      {fit !== undefined && (
        <p class="straightened">
          {lawsWords.straight(fit.form.plot, fit.form.against, fit.form.slope, fit.form.intercept)}
        </p>
      )}
      {fit !== undefined && fit.form.note !== '' && <p class="hint">{fit.form.note}</p>}
    </div>
  );
}

function Settled(props: { readonly fit: Fit; readonly depth: InDepth }) {
  const { fit, depth } = props;
  const { workbook, say } = useSession();
  return (
    <>
      <Guard of={fit}>
        <StraightView fit={fit} />
      </Guard>
      <Constants fit={fit} />
      <Checks found={depth.findings} />
      <Statement fit={fit} />
      <Guard of={fit}>
        <CurveView fit={fit} />
      </Guard>
      <ReadOff fit={fit} />
      <Guard of={fit}>
        <PlanReading fit={fit} />
      </Guard>
      <Known depth={depth} />
      <Guard of={fit}>
        <ReadingList fit={fit} found={depth.rows} />
      </Guard>
      <Guard of={fit}>
        <Handover choice={depth.choice} fit={fit} workbook={workbook} say={say} />
      </Guard>
    </>
  );
}
