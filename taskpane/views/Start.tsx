import { readingsWords } from '../../core/words/panelWords.ts';
import { Section } from './parts.tsx';
import { UseSelection } from './UseSelection.tsx';

/** What a new user sees: what to do first. */
export function Start() {
  return (
    <Section id="readings" title={readingsWords.startTitle}>
      <Hanging />
      <ol class="steps">
        <li>{readingsWords.startSelect}</li>
        <li>{readingsWords.startUse}</li>
        <li>{readingsWords.startLook}</li>
      </ol>
      <UseSelection name={readingsWords.use} main />
      <p class="hint">{readingsWords.startHint}</p>
    </Section>
  );
}

/** Readings that hang in a curve, and the same readings on a taut line. */
function Hanging() {
  const at = [0, 1, 2, 3, 4, 5, 6];
  return (
    <svg class="hanging" viewBox="0 0 300 84" aria-hidden="true" focusable="false">
      {at.map((i) => (
        <circle key={i} class="dot" cx={14 + 18 * i} cy={10 + 62 * (1 - Math.exp(-i / 1.9))} r="3.4" />
      ))}
      <path class="arrow" d="M138 42 H158 M153 37 L158 42 L153 47" />
      <path class="line" d="M176 8 L296 76" />
      {at.map((i) => (
        <circle key={i} class="dot" cx={182 + 18 * i} cy={11.4 + 10.2 * i + (i % 3) - 1} r="3.4" />
      ))}
    </svg>
  );
}
