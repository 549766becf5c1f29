import { listWords, stepWords } from '../../core/words/panelWords.ts';
import { withLeftOut } from '../state/changes.ts';
import { headingText } from '../state/heading.ts';
import type { ReadingRow } from '../state/readingRows.ts';
import { useChoice, useSession } from './context.ts';
import { figures } from './figures.ts';

/** The reading that is looked at, and what can be done with it. */
export function PickedReading(props: { readonly row: ReadingRow | undefined }) {
  const session = useSession();
  const { xHeading, yHeading } = useChoice();
  const { row } = props;
  if (row === undefined) return <p class="hint">{listWords.none}</p>;
  const { position, leftOut } = row;
  const step = leftOut ? stepWords.takeBack : stepWords.leaveOut;
  const facts: readonly (readonly [string, string])[] = [
    [headingText(xHeading), figures(row.x, 8)],
    [headingText(yHeading), figures(row.y, 8)],
    [listWords.residual, figures(row.residual, 3)],
    [listWords.standardised, figures(row.standardised, 3)],
    [listWords.leverage, figures(row.leverage, 3)],
  ];
  return (
    <div class="picked" data-position={position}>
      <p class="strong">{listWords.name(position)}</p>
      <dl class="facts">
        {facts
          .filter(([, value]) => value !== '')
          .map(([name, value]) => (
            <div key={name}>
              <dt>{name}</dt>
              <dd class="number">{value}</dd>
            </div>
          ))}
      </dl>
      {row.finding !== '' && <p>{row.finding}</p>}
      <p class="buttons">
        <button
          type="button"
          onClick={() => session.change(step(position), (choice) => withLeftOut(choice, position, !leftOut))}
        >
          {leftOut ? listWords.takeIn : listWords.leaveOut}
        </button>
        <button type="button" onClick={() => void session.showReading(position)}>
          {listWords.show}
        </button>
      </p>
    </div>
  );
}
