import { useId } from 'preact/hooks';
import { lawsWords, stepWords } from '../../core/words/panelWords.ts';
import { withLaw, withOwnLaw } from '../state/changes.ts';
import { tradeLaws } from '../state/compareLaws.ts';
import { useChoice, useSession } from './context.ts';

/** Adds a named law of the catalogue to the comparison, and chooses it. */
export function TradeLaw() {
  const session = useSession();
  const id = useId();
  const { ownLaws } = useChoice();
  const add = (law: string): void => {
    if (law === '') return;
    session.change(stepWords.addLaw(law), (current) => withLaw(withOwnLaw(current, law), law));
  };
  return (
    <div class="field">
      <label for={id}>{lawsWords.trade}</label>
      <select
        id={id}
        value=""
        onChange={(event) => {
          add(event.currentTarget.value);
          event.currentTarget.value = '';
        }}
      >
        <option value="">{lawsWords.tradeFirst}</option>
        {tradeLaws
          .filter(({ name }) => !ownLaws.includes(name))
          .map(({ name, equation }) => (
            <option key={name} value={name}>
              {`${name}:  ${equation}`}
            </option>
          ))}
      </select>
    </div>
  );
}
