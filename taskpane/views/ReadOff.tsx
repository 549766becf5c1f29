import { useId, useState } from 'preact/hooks';
import type { Fit } from '../../core/fit/fit.ts';
import { numberFromText } from '../../core/readings/numberFromText.ts';
import { beyondReadings } from '../../core/readoff/beyondReadings.ts';
import { predictorAt } from '../../core/readoff/predictorAt.ts';
import type { ReadOff as Read } from '../../core/readoff/readOff.ts';
import { responseAt } from '../../core/readoff/responseAt.ts';
import { readOffWords } from '../../core/words/panelWords.ts';
import type { Heading } from '../state/choice.ts';
import { attempt, problemIn, valueIn } from '../state/outcome.ts';
import { useChoice } from './context.ts';
import { figures, percent, rounded } from './figures.ts';
import { Part } from './parts.tsx';

/** y for an x of the user's, and x for a y. */
export function ReadOff(props: { readonly fit: Fit }) {
  const { xHeading, yHeading } = useChoice();
  const { fit } = props;
  return (
    <Part title={readOffWords.title}>
      <div class="read-off">
        <OneWay fit={fit} from={xHeading} to={yHeading} given="x" read={responseAt} />
        <OneWay fit={fit} from={yHeading} to={xHeading} given="y" read={predictorAt} />
      </div>
    </Part>
  );
}

function OneWay(props: {
  readonly fit: Fit;
  readonly from: Heading;
  readonly to: Heading;
  /** The side of `from`. */
  readonly given: 'x' | 'y';
  readonly read: (fit: Fit, at: number) => Read;
}) {
  const { fit, from, to, given, read } = props;
  const id = useId();
  const [text, setText] = useState('');
  const typed = text.trim();
  const at = typed === '' ? Number.NaN : numberFromText(typed);
  const outcome = Number.isNaN(at) ? null : attempt(() => read(fit, at));
  const found = valueIn(outcome);
  const wrong =
    typed !== '' && Number.isNaN(at) ? readOffWords.notNumber(typed) : problemIn(outcome)?.message;
  return (
    <div class="one-way">
      <label for={id}>
        {readOffWords.given(from.name)} <span class="quiet">{readOffWords.unitHint(from.unit)}</span>
      </label>
      <input
        id={id}
        type="text"
        inputmode="decimal"
        autocomplete="off"
        value={text}
        aria-invalid={wrong === undefined ? undefined : 'true'}
        aria-describedby={`${id}-result`}
        onInput={(event) => setText(event.currentTarget.value)}
      />
      <div id={`${id}-result`} aria-live="polite">
        {wrong !== undefined && <p class="wrong">{wrong}</p>}
        {typed === '' && <p class="hint">{readOffWords.nothing}</p>}
        {found !== undefined && <Result fit={fit} found={found} to={to} />}
        {found !== undefined && <Beyond fit={fit} given={given} at={at} />}
      </div>
    </div>
  );
}

function Result(props: { readonly fit: Fit; readonly found: Read; readonly to: Heading }) {
  const { fit, found, to } = props;
  const { value, uncertainty, low, high, power } = rounded(
    found.value,
    found.standardUncertainty,
    found.low,
    found.high,
  );
  const number = uncertainty === '' ? value : `${value} ± ${uncertainty}`;
  const whole = power !== '' && uncertainty !== '' ? `(${number})${power}` : `${number}${power}`;
  return (
    <>
      <p class="read-result number">
        {readOffWords.result(to.name, whole)} {to.unit}
      </p>
      {low !== '' && high !== '' && (
        <p class="quiet">
          {readOffWords.range(`${low}${power}`, `${high}${power}`, percent(fit.settings.options.coverage))}
        </p>
      )}
    </>
  );
}

/** Says so when the value lies outside the readings, where nothing supports the law. */
function Beyond(props: { readonly fit: Fit; readonly given: 'x' | 'y'; readonly at: number }) {
  const range = beyondReadings(props.fit, props.given, props.at);
  if (range === null) return null;
  return <p class="beyond">{readOffWords.beyond(figures(range.low, 6), figures(range.high, 6))}</p>;
}
