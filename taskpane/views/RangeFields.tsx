import { useState } from 'preact/hooks';
import { readingsWords, stepWords } from '../../core/words/panelWords.ts';
import { qualified } from '../host/address.ts';
import { HostTrouble } from '../host/workbook.ts';
import { swapped, withHeading } from '../state/changes.ts';
import { withPlaces } from '../state/growth.ts';
import { useChoice, useSession } from './context.ts';
import { Field } from './parts.tsx';

/** The ranges of x and y, their names and units, to be changed by hand. */
export function RangeFields() {
  const session = useSession();
  const choice = useChoice();
  const [wrong, setWrong] = useState<{ readonly axis: 'x' | 'y'; readonly text: string } | null>(null);

  const setCells = async (axis: 'x' | 'y', text: string): Promise<void> => {
    try {
      const place = await session.placeFrom(text);
      setWrong(null);
      session.change(stepWords.ranges, (current) => ({
        ...withPlaces(current, { x: current.x, y: current.y, [axis]: place }),
        leftOut: [],
      }));
    } catch (error) {
      if (!(error instanceof HostTrouble)) throw error;
      setWrong({ axis, text: error.message });
    }
  };

  return (
    <div class="range-fields">
      {(['x', 'y'] as const).map((axis) => {
        const heading = axis === 'x' ? choice.xHeading : choice.yHeading;
        const name = (part: 'name' | 'unit') => (text: string) =>
          session.change(stepWords.heading, (current) =>
            withHeading(current, axis, { ...heading, [part]: text.trim() }),
          );
        return (
          <fieldset key={axis}>
            <legend class="unseen">{axis}</legend>
            <Field
              label={axis === 'x' ? readingsWords.xCells : readingsWords.yCells}
              value={qualified(choice[axis].sheet, choice[axis].address)}
              problem={wrong?.axis === axis ? wrong.text : undefined}
              onCommit={(text) => void setCells(axis, text).catch(session.warn)}
            />
            <div class="pair">
              <Field label={readingsWords.name(axis)} value={heading.name} onCommit={name('name')} />
              <Field label={readingsWords.unit(axis)} value={heading.unit} onCommit={name('unit')} />
            </div>
          </fieldset>
        );
      })}
      <button type="button" onClick={() => session.change(stepWords.swap, swapped)}>
        {readingsWords.swap}
      </button>
    </div>
  );
}
