import type { Problem } from '../../core/problem.ts';
import { depthWords, listWords, readingsWords, stepWords } from '../../core/words/panelWords.ts';
import { withLeftOut, withOption } from '../state/changes.ts';
import { useSession } from './context.ts';

/** Why there is no line for the chosen law, with what can be done about it. */
export function Stopped(props: { readonly problem: Problem }) {
  const session = useSession();
  const { code, message, position } = props.problem;
  return (
    <div class="notice stop">
      <p class="strong">{depthWords.stopped}</p>
      <p>{message}</p>
      {code === 'domain' && (
        <p class="buttons">
          {position !== undefined && (
            <>
              <button type="button" onClick={() => void session.showReading(position)}>
                {readingsWords.showCell(position)}
              </button>
              <button
                type="button"
                onClick={() =>
                  session.change(stepWords.leaveOut(position), (choice) =>
                    withLeftOut(choice, position, true),
                  )
                }
              >
                {listWords.leaveOut}
              </button>
            </>
          )}
          <button
            type="button"
            onClick={() =>
              session.change(stepWords.option('outside'), (choice) =>
                withOption(choice, 'outside', 'set aside'),
              )
            }
          >
            {depthWords.setOutsideAside}
          </button>
        </p>
      )}
    </div>
  );
}
