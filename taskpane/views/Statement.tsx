import { useMemo, useRef, useState } from 'preact/hooks';
import type { Fit } from '../../core/fit/fit.ts';
import { statement } from '../../core/statement/statement.ts';
import { depthWords } from '../../core/words/panelWords.ts';
import { mainConstant } from '../state/mainConstant.ts';
import { attempt, problemIn, valueIn } from '../state/outcome.ts';
import { useChoice, useSession } from './context.ts';
import { Choose, Part } from './parts.tsx';

/** The result as a sentence to paste. */
export function Statement(props: { readonly fit: Fit }) {
  const { fit } = props;
  const session = useSession();
  const { units } = useChoice();
  const [wanted, setWanted] = useState('');
  const sentenceElement = useRef<HTMLParagraphElement>(null);
  const constants = valueIn(attempt(() => fit.constants)) ?? [];
  const names = constants.map((constant) => constant.name);
  const name = mainConstant(fit, names, wanted);
  const unit = units?.get(name) ?? '';
  const written = useMemo(() => attempt(() => statement(fit, name, unit)), [fit, name, unit]);
  if (name === '') return null;
  const sentence = valueIn(written);

  const copy = async (): Promise<void> => {
    if (sentence === undefined) return;
    session.say(
      (await copyText(sentence, sentenceElement.current)) ? depthWords.copied : depthWords.copyFailed,
    );
  };

  return (
    <Part title={depthWords.statement}>
      {names.length > 1 && (
        <Choose
          label={depthWords.statementFor}
          value={name}
          options={names.map((one) => [one, one])}
          onChoose={setWanted}
        />
      )}
      {sentence !== undefined ? (
        <>
          <p class="sentence" ref={sentenceElement}>
            {sentence}
          </p>
          <button type="button" onClick={() => void copy().catch(session.warn)}>
            {depthWords.copy}
          </button>
        </>
      ) : (
        <p class="wrong">{problemIn(written)?.message}</p>
      )}
    </Part>
  );
}

/** Copies a text; where the page may not write to the clipboard, selects it and asks the browser to copy. */
async function copyText(text: string, element: HTMLElement | null): Promise<boolean> {
  try {
    await navigator.clipboard.writeText(text);
    return true;
  } catch {
    const selection = document.getSelection();
    if (element === null || selection === null) return false;
    selection.selectAllChildren(element);
    return document.execCommand('copy');
  }
}
