import { panelWords, readingsWords } from '../../core/words/panelWords.ts';
import { usePart, useSession } from './context.ts';

/** Something that stands in the way, with what can be done about it. */
export function Notice() {
  const session = useSession();
  const notice = usePart((state) => state.notice);
  // The region is always there, so that screen readers hear what appears in it.
  return (
    <div role="alert">
      {notice !== null && (
        <div class={`notice ${notice.tone}`}>
          <p>{notice.text}</p>
          <p class="buttons">
            {notice.tone === 'stop' && (
              <button type="button" onClick={() => session.readAgain()}>
                {panelWords.readAgain}
              </button>
            )}
            {notice.trouble === 'gone' && (
              <button type="button" onClick={() => void session.takeSelection().catch(session.warn)}>
                {readingsWords.replace}
              </button>
            )}
            <button type="button" onClick={() => session.dismiss()}>
              {panelWords.dismiss}
            </button>
          </p>
        </div>
      )}
    </div>
  );
}
