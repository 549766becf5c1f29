import { useMemo, useState } from 'preact/hooks';
import { pick } from '../../core/fit/columns.ts';
import type { Fit } from '../../core/fit/fit.ts';
import { rangeOf } from '../../core/line/rangeOf.ts';
import { nextReading } from '../../core/next/nextReading.ts';
import { readingsForTarget } from '../../core/next/readingsForTarget.ts';
import { numberFromText } from '../../core/readings/numberFromText.ts';
import { planWords } from '../../core/words/panelWords.ts';
import { mainConstant } from '../state/mainConstant.ts';
import { attempt, problemIn, valueIn } from '../state/outcome.ts';
import { useChoice } from './context.ts';
import { figures } from './figures.ts';
import { Choose, Field, Part } from './parts.tsx';

/** Where one more reading would tell the most, and how many it takes; worked out only while it is open. */
export function PlanReading(props: { readonly fit: Fit }) {
  const [open, setOpen] = useState(false);
  return (
    <Part title={planWords.title} kind="plan">
      <details onToggle={(event) => setOpen(event.currentTarget.open)}>
        <summary>{planWords.open}</summary>
        <div>{open && <Plan fit={props.fit} />}</div>
      </details>
    </Part>
  );
}

function Plan(props: { readonly fit: Fit }) {
  const { fit } = props;
  const { xHeading, units } = useChoice();
  const [wanted, setWanted] = useState('');
  const [from, setFrom] = useState('');
  const [to, setTo] = useState('');
  const [target, setTarget] = useState('');
  const constants = valueIn(attempt(() => fit.constants)) ?? [];
  const names = constants.filter(({ value }) => Number.isFinite(value)).map(({ name }) => name);
  const name = mainConstant(fit, names, wanted);
  const unit = units?.get(name) ?? '';
  const [least, most] = useMemo(() => rangeOf(pick(fit.readings.x, fit.taking)), [fit]);
  if (name === '') return null;
  const low = typed(from, least);
  const high = typed(to, most);
  return (
    <>
      {names.length > 1 && (
        <Choose
          label={planWords.constant}
          value={name}
          options={names.map((one) => [one, one])}
          onChoose={setWanted}
        />
      )}
      <p class="hint">{planWords.between(xHeading.name)}</p>
      <div class="plan-range">
        <Field
          label={planWords.from(xHeading.unit)}
          value={from}
          placeholder={figures(least)}
          problem={problemOf(from)}
          onCommit={setFrom}
        />
        <Field
          label={planWords.to(xHeading.unit)}
          value={to}
          placeholder={figures(most)}
          problem={problemOf(to)}
          onCommit={setTo}
        />
      </div>
      {Number.isFinite(low) && Number.isFinite(high) && (
        <Best fit={fit} name={name} unit={unit} low={low} high={high} />
      )}
      <Field
        label={planWords.wanted(name, unit)}
        value={target}
        problem={problemOf(target)}
        onCommit={setTarget}
      />
      {problemOf(target) === undefined && target.trim() !== '' && (
        <Needed fit={fit} name={name} target={numberFromText(target.trim())} />
      )}
    </>
  );
}

function Best(props: {
  readonly fit: Fit;
  readonly name: string;
  readonly unit: string;
  readonly low: number;
  readonly high: number;
}) {
  const { fit, name, unit, low, high } = props;
  const { xHeading } = useChoice();
  const outcome = useMemo(() => attempt(() => nextReading(fit, name, low, high)), [fit, name, low, high]);
  const found = valueIn(outcome);
  return (
    <div aria-live="polite">
      {found === undefined && <p class="wrong">{problemIn(outcome)?.message}</p>}
      {found !== undefined && (
        <>
          <p class="read-result number">{planWords.at(xHeading.name, figures(found.x), xHeading.unit)}</p>
          <p class="quiet">
            {Number.isFinite(found.now)
              ? planWords.gain(name, figures(found.now, 2), figures(found.after, 2), unit)
              : planWords.noScatter(name)}
          </p>
        </>
      )}
    </div>
  );
}

function Needed(props: { readonly fit: Fit; readonly name: string; readonly target: number }) {
  const { fit, name, target } = props;
  const outcome = attempt(() => readingsForTarget(fit, name, target));
  const found = valueIn(outcome);
  return (
    <div aria-live="polite">
      {found === undefined ? (
        <p class="wrong">{problemIn(outcome)?.message}</p>
      ) : (
        <p>{found.more === 0 ? planWords.reached : planWords.needed(found.more, found.total)}</p>
      )}
    </div>
  );
}

/** A number as typed, or what stands for nothing; NaN for anything else. */
function typed(text: string, otherwise: number): number {
  return text.trim() === '' ? otherwise : numberFromText(text.trim());
}

function problemOf(text: string): string | undefined {
  return Number.isNaN(typed(text, 0)) ? planWords.notNumber(text.trim()) : undefined;
}
