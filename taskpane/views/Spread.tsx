import { useState } from 'preact/hooks';
import { knownWords, stepWords } from '../../core/words/panelWords.ts';
import { qualified } from '../host/address.ts';
import { HostTrouble } from '../host/workbook.ts';
import { withSpread } from '../state/changes.ts';
import type { SpreadEntry } from '../state/choice.ts';
import { besides } from '../state/growth.ts';
import { headingText } from '../state/heading.ts';
import { useChoice, usePart, useSession } from './context.ts';
import { Choose, Field } from './parts.tsx';

type Kind = keyof typeof knownWords.spread;

function kindOf(entry: SpreadEntry): Kind {
  if (entry.kind === 'range') return 'range';
  const text = entry.text.trim().toLowerCase();
  if (text === '') return 'none';
  return text === 'equal' || text === 'proportional' ? text : 'number';
}

/** How uncertain the readings are in one direction. */
export function Spread(props: {
  readonly axis: 'x' | 'y';
  readonly name: string;
  readonly problem: string | undefined;
}) {
  const { axis, name, problem } = props;
  const session = useSession();
  const choice = useChoice();
  const entry = axis === 'x' ? choice.spreadX : choice.spreadY;
  const columns = usePart((state) => state.columns);
  // A kind that needs a text is held here until the text is there.
  const [wanted, setWanted] = useState<Kind | null>(null);
  const [refused, setRefused] = useState('');
  const kind = wanted ?? kindOf(entry);
  const kinds: readonly Kind[] =
    axis === 'x' ? ['none', 'number', 'range'] : ['none', 'equal', 'proportional', 'number', 'range'];

  // Other columns that were selected with the readings may hold their uncertainties.
  const beside = columns
    .map(({ place, heading }) => ({ place: besides(place, choice.y), heading }))
    .filter(({ place }) => place.address !== choice.x.address && place.address !== choice.y.address);

  const set = (spread: SpreadEntry): void => {
    setWanted(null);
    setRefused('');
    session.change(stepWords.uncertainty(axis), (current) => withSpread(current, axis, spread));
  };
  const choose = (next: Kind): void => {
    if (next === 'number' || next === 'range') {
      setWanted(next);
      setRefused('');
    } else set({ kind: 'text', text: next === 'none' ? '' : next });
  };
  const setRange = async (text: string): Promise<void> => {
    try {
      set({ kind: 'range', place: await session.placeFrom(text) });
    } catch (error) {
      if (!(error instanceof HostTrouble)) throw error;
      setRefused(error.message);
    }
  };
  const fromSelection = async (): Promise<void> => {
    const place = await session.selectedPlace();
    if (place !== undefined) set({ kind: 'range', place });
  };

  return (
    <fieldset class="spread" data-axis={axis}>
      <legend class="unseen">{knownWords.uncertaintyY(name)}</legend>
      <Choose
        label={axis === 'x' ? knownWords.uncertaintyX(name) : knownWords.uncertaintyY(name)}
        value={kind}
        options={[
          ...kinds.map((one): readonly [string, string] => [
            one,
            axis === 'x' && one === 'none' ? knownWords.spread.exact : knownWords.spread[one],
          ]),
          ...beside.map(({ place, heading }): readonly [string, string] => [
            place.address,
            knownWords.fromColumn(headingText(heading)),
          ]),
        ]}
        onChoose={(value) => {
          const column = beside.find(({ place }) => place.address === value);
          if (column !== undefined) set({ kind: 'range', place: column.place });
          const next = kinds.find((one) => one === value);
          if (next !== undefined) choose(next);
        }}
      />
      {kind === 'number' && (
        <Field
          label={knownWords.spreadText}
          value={entry.kind === 'text' && kindOf(entry) === 'number' ? entry.text : ''}
          problem={problem}
          onCommit={(text) => set({ kind: 'text', text: text.trim() })}
        />
      )}
      {kind === 'range' && (
        <>
          <Field
            label={knownWords.spreadRange}
            value={entry.kind === 'range' ? qualified(entry.place.sheet, entry.place.address) : ''}
            problem={refused || problem}
            onCommit={(text) => void setRange(text).catch(session.warn)}
          />
          <button type="button" onClick={() => void fromSelection().catch(session.warn)}>
            {knownWords.fromSelection}
          </button>
        </>
      )}
      {kind !== 'number' && kind !== 'range' && problem !== undefined && <p class="wrong">{problem}</p>}
    </fieldset>
  );
}
