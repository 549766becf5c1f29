import { readingsWords } from '../../core/words/panelWords.ts';
import { usePart, useSession } from './context.ts';

/** The button that takes the readings from the sheet's selection, with what is selected now. */
export function UseSelection(props: { readonly name: string; readonly main?: boolean }) {
  const session = useSession();
  const selected = usePart((state) => state.selected);
  const refused = usePart((state) => state.refused);
  return (
    <div class="use-selection">
      <button
        type="button"
        class={props.main ? 'main' : undefined}
        onClick={() => void session.takeSelection().catch(session.warn)}
      >
        {props.name}
      </button>
      <p class="quiet selected-now">
        {selected !== null && readingsWords.selectedNow(selected.address, selected.shape)}
      </p>
      <div role="alert">{refused !== '' && <p class="wrong">{refused}</p>}</div>
    </div>
  );
}
