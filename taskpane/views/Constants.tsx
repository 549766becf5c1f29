import type { ConstantEstimate, Fit } from '../../core/fit/fit.ts';
import { depthWords, stepWords } from '../../core/words/panelWords.ts';
import { withUnit } from '../state/changes.ts';
import { attempt, problemIn, valueIn } from '../state/outcome.ts';
import { useChoice, useSession } from './context.ts';
import { figures, percent, rounded } from './figures.ts';
import { Part } from './parts.tsx';

/** The constants that the readings settle, each with its standard uncertainty and coverage interval. */
export function Constants(props: { readonly fit: Fit }) {
  const { fit } = props;
  const constants = attempt(() => fit.constants);
  const problem = problemIn(constants);
  const given = fit.law.known.map((name) => {
    const known = fit.settings.known.get(name);
    if (known === undefined) return depthWords.givenValue(name, figures(fit.law.builtIn.get(name) ?? '', 10));
    const { value, uncertainty, power } = rounded(
      known.value,
      known.standardUncertainty,
      known.value,
      known.value,
    );
    const uncertain = uncertainty !== '' && uncertainty !== '0';
    return depthWords.givenValue(
      name,
      uncertain ? `${value} ± ${uncertainty}${power}` : figures(known.value, 10),
    );
  });
  return (
    <Part title={depthWords.constants}>
      {problem !== undefined && <p class="wrong">{problem.message}</p>}
      <ul class="constants">
        {(valueIn(constants) ?? []).filter(exists).map((constant) => (
          <Constant key={constant.name} constant={constant} coverage={fit.settings.options.coverage} />
        ))}
      </ul>
      {given.length > 0 && <p class="hint">{depthWords.given(given.join(', '))}</p>}
    </Part>
  );
}

/** A half-life of something that grows does not exist. */
function exists({ value }: ConstantEstimate): boolean {
  return Number.isFinite(value);
}

function Constant(props: { readonly constant: ConstantEstimate; readonly coverage: number }) {
  const session = useSession();
  const { name, value, standardUncertainty, low, high, derived } = props.constant;
  const unit = useChoice().units?.get(name) ?? '';
  const shown = rounded(value, standardUncertainty, low, high);
  const uncertain = shown.uncertainty !== '';
  const brackets = shown.power !== '' && uncertain;
  return (
    <li class={derived ? 'constant derived' : 'constant'} data-constant={name}>
      <p class="result">
        <span class="symbol math">{name}</span>
        <span class="equals">=</span>
        <span class="number value">
          {brackets && '('}
          {shown.value}
        </span>
        {uncertain && (
          <span class="number uncertainty" title={depthWords.standardUncertainty}>
            <span class="plus-minus"> ± </span>
            {shown.uncertainty}
          </span>
        )}
        {shown.power !== '' && (
          <span class="number value">
            {brackets && ')'}
            {shown.power}
          </span>
        )}
        <input
          type="text"
          class="unit"
          aria-label={depthWords.unitOf(name)}
          placeholder={depthWords.unit}
          autocomplete="off"
          spellcheck={false}
          style={{ width: `${Math.max(4, unit.length) + 1}ch` }}
          value={unit}
          onChange={(event) => {
            const text = event.currentTarget.value;
            session.change(stepWords.unit(name), (choice) => withUnit(choice, name, text));
          }}
        />
      </p>
      <p class="quiet">
        {shown.low !== '' && shown.high !== ''
          ? `${depthWords.interval(percent(props.coverage))} ${depthWords.to(shown.low, shown.high)}${shown.power}`
          : depthWords.noUncertainty}
      </p>
    </li>
  );
}
