import { panelWords } from '../../core/words/panelWords.ts';
import { usePart, useSession } from './context.ts';

/** Name of the panel, and the way back and forth between steps; its right end stays free for the host's own button. */
export function Head() {
  const session = useSession();
  const past = usePart((state) => state.history.past.at(-1)?.what);
  const future = usePart((state) => state.history.future[0]?.what);
  return (
    <header class="head">
      <svg class="mark" viewBox="0 0 80 80" width="20" height="20" aria-hidden="true" focusable="false">
        <path class="mark-curve" d="M17 19 C18 50 34 65 64 62" />
        <path class="mark-line" d="M17 18 L64 61" />
        <circle class="mark-end" cx="17" cy="18" r="8" />
        <circle class="mark-end" cx="64" cy="61" r="8" />
      </svg>
      <h1>Tautline</h1>
      <Step what={past} name={panelWords.undo} full={panelWords.undoOf} onStep={() => session.undo()}>
        <path d="M6 3 2.5 6.5 6 10 M2.5 6.5 H9.5 A4 4 0 0 1 9.5 14.5 H6" />
      </Step>
      <Step what={future} name={panelWords.redo} full={panelWords.redoOf} onStep={() => session.redo()}>
        <path d="M10 3 13.5 6.5 10 10 M13.5 6.5 H6.5 A4 4 0 0 0 6.5 14.5 H10" />
      </Step>
    </header>
  );
}

function Step(props: {
  readonly what: string | undefined;
  readonly name: string;
  readonly full: (what: string) => string;
  readonly onStep: () => void;
  readonly children: preact.ComponentChildren;
}) {
  const { what } = props;
  const name = what === undefined ? props.name : props.full(what);
  return (
    <button
      type="button"
      class="icon"
      aria-label={name}
      title={name}
      aria-disabled={what === undefined}
      onClick={() => props.onStep()}
    >
      <svg viewBox="0 0 16 17" width="16" height="17" aria-hidden="true" focusable="false">
        {props.children}
      </svg>
    </button>
  );
}
