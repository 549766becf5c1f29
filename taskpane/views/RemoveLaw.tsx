import { lawsWords, stepWords } from '../../core/words/panelWords.ts';
import { withoutOwnLaw } from '../state/changes.ts';
import { useChoice, useSession } from './context.ts';

/** Takes a law that the user added out of the comparison. */
export function RemoveLaw(props: { readonly law: string }) {
  const session = useSession();
  const { law } = props;
  if (!useChoice().ownLaws.includes(law)) return null;
  return (
    <button
      type="button"
      class="icon remove"
      aria-label={lawsWords.remove(law)}
      title={lawsWords.remove(law)}
      onClick={() => session.change(stepWords.removeLaw(law), (current) => withoutOwnLaw(current, law))}
    >
      <svg viewBox="0 0 12 12" width="12" height="12" aria-hidden="true" focusable="false">
        <path d="M2 2 10 10 M10 2 2 10" />
      </svg>
    </button>
  );
}
