import { useMemo } from 'preact/hooks';
import type { Fit } from '../../core/fit/fit.ts';
import { checks } from '../../core/judge/checks.ts';
import { depthWords } from '../../core/words/panelWords.ts';
import { attempt, problemIn, valueIn } from '../state/outcome.ts';
import { Part } from './parts.tsx';

/** What a careful engineer would say about the fit, the most serious first. */
export function Checks(props: { readonly fit: Fit }) {
  const { fit } = props;
  const found = useMemo(() => attempt(() => checks(fit)), [fit]);
  const problem = problemIn(found);
  const findings = valueIn(found) ?? [];
  return (
    <Part title={depthWords.checks}>
      {problem !== undefined && <p class="wrong">{problem.message}</p>}
      {problem === undefined && findings.length === 0 && <p class="quiet">{depthWords.noChecks}</p>}
      <ul class="checks">
        {findings.map(({ level, text }) => (
          <li key={`${level}${text}`} class={level}>
            <span class="level">{depthWords.level[level]}</span>
            <span>{text}</span>
          </li>
        ))}
      </ul>
    </Part>
  );
}
