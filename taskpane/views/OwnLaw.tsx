import { useId, useMemo, useState } from 'preact/hooks';
import { compileLaw } from '../../core/law/compileLaw.ts';
import { lawsWords, stepWords } from '../../core/words/panelWords.ts';
import { withLaw, withOwnLaw } from '../state/changes.ts';
import { attempt, problemIn, valueIn } from '../state/outcome.ts';
import { useChoice, useSession } from './context.ts';

/** A field for the user's own law, straightened while it is typed; what is wrong stands under it, at its place. */
export function OwnLaw() {
  const session = useSession();
  const id = useId();
  const [text, setText] = useState('');
  const typed = text.trim();
  const names = useChoice()
    .known.map(({ name }) => name)
    .join(' ');
  const compiled = useMemo(() => {
    if (typed === '') return null;
    const alone = attempt(() => compileLaw(typed, []));
    const problem = problemIn(alone);
    // A law that readings cannot settle alone may be settled with what is known.
    if (problem === undefined || names === '' || problem.code === 'argument') return alone;
    return attempt(() => compileLaw(typed, names.split(' ')));
  }, [typed, names]);
  const problem = problemIn(compiled);
  const form = valueIn(compiled)?.forms[0];
  const told = problem !== undefined || form !== undefined;
  // A law that only lacks known constants can be taken: they are asked for once it is chosen.
  const unusable = typed === '' || problem?.code === 'argument';

  const compare = (): void => {
    if (unusable) return;
    session.change(stepWords.addLaw(typed), (current) => withLaw(withOwnLaw(current, typed), typed));
    setText('');
  };

  return (
    <form
      class="own-law field"
      onSubmit={(event) => {
        event.preventDefault();
        compare();
      }}
    >
      <label for={id}>{lawsWords.own}</label>
      <div class="with-button">
        <input
          id={id}
          type="text"
          class="math"
          autocomplete="off"
          spellcheck={false}
          value={text}
          aria-invalid={problem === undefined ? undefined : 'true'}
          aria-describedby={told ? `${id}-told` : `${id}-hint`}
          onInput={(event) => setText(event.currentTarget.value)}
        />
        <button type="submit" disabled={unusable}>
          {lawsWords.compare}
        </button>
      </div>
      <div id={`${id}-told`} aria-live="polite">
        {problem !== undefined && (
          <>
            <At text={typed} position={problem.position} />
            <p class="wrong">{problem.message}</p>
          </>
        )}
        {form !== undefined && (
          <>
            <p class="straightened">
              {lawsWords.straight(form.plot, form.against, form.slope, form.intercept)}
            </p>
            {form.note !== '' && <p class="hint">{form.note}</p>}
          </>
        )}
      </div>
      {!told && (
        <p class="hint" id={`${id}-hint`}>
          {lawsWords.ownHelp} <span class="math">{lawsWords.ownExample}</span>
        </p>
      )}
    </form>
  );
}

/** The text with the place that a message speaks of marked in it. */
function At(props: { readonly text: string; readonly position: number | undefined }) {
  const { text, position } = props;
  if (position === undefined || position < 1) return null;
  const at = position - 1;
  return (
    <p class="at math" aria-hidden="true">
      {text.slice(0, at)}
      <mark>{text.slice(at, at + 1) || ' '}</mark>
      {text.slice(at + 1)}
    </p>
  );
}
