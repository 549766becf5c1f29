import { depthWords } from '../../core/words/panelWords.ts';
import { problemIn, valueIn } from '../state/outcome.ts';
import type { Depth } from '../state/panelState.ts';
import { Part } from './parts.tsx';

/** What a careful engineer would say about the fit, the most serious first. */
export function Checks(props: { readonly found: Depth['findings'] }) {
  const { found } = props;
  const problem = problemIn(found);
  const findings = valueIn(found) ?? [];
  return (
    <Part title={depthWords.checks}>
      {problem !== undefined && <p class="wrong">{problem.message}</p>}
      {found === null && <p class="quiet">{depthWords.checking}</p>}
      {found !== null && problem === undefined && findings.length === 0 && (
        <p class="quiet">{depthWords.noChecks}</p>
      )}
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
