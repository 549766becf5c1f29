import { readingsWords, stepWords } from '../../core/words/panelWords.ts';
import { withColumn } from '../state/changes.ts';
import { besides } from '../state/growth.ts';
import { headingText } from '../state/heading.ts';
import { useChoice, usePart, useSession } from './context.ts';

/** What x or y is; where more columns were selected than two, another of them can be taken instead. */
export function ColumnChoice(props: { readonly axis: 'x' | 'y' }) {
  const { axis } = props;
  const session = useSession();
  const choice = useChoice();
  const columns = usePart((state) => state.columns);
  const heading = axis === 'x' ? choice.xHeading : choice.yHeading;
  const places = columns.map(({ place }) => besides(place, choice[axis]));
  const at = places.findIndex(
    ({ sheet, address }) => sheet === choice[axis].sheet && address === choice[axis].address,
  );
  if (columns.length < 3 || at < 0) return <>{headingText(heading)}</>;
  return (
    <select
      aria-label={readingsWords.column(axis)}
      value={String(at)}
      onChange={(event) => {
        const index = Number(event.currentTarget.value);
        const [place, column] = [places[index], columns[index]];
        if (place === undefined || column === undefined) return;
        session.change(stepWords.ranges, (current) => withColumn(current, axis, place, column.heading));
      }}
    >
      {columns.map((column, index) => (
        <option key={column.place.address} value={String(index)} selected={index === at}>
          {headingText(index === at ? heading : column.heading)}
        </option>
      ))}
    </select>
  );
}
