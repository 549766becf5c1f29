import { readingsWords } from '../../core/words/panelWords.ts';
import { qualified } from '../host/address.ts';
import { problemIn, valueIn } from '../state/outcome.ts';
import { ColumnChoice } from './ColumnChoice.tsx';
import { useChoice, usePart, useSession } from './context.ts';
import { Section } from './parts.tsx';
import { RangeFields } from './RangeFields.tsx';
import { UseSelection } from './UseSelection.tsx';

/** Which cells the readings come from, and what becomes of each. */
export function Readings() {
  const choice = useChoice();
  const readings = usePart((state) => state.readings);
  const problem = problemIn(readings);
  return (
    <Section id="readings" title={readingsWords.title}>
      <dl class="columns-taken">
        {(['x', 'y'] as const).map((axis) => {
          const place = choice[axis];
          return (
            <div key={axis}>
              <dt>{axis}</dt>
              <dd class="quantity">
                <ColumnChoice axis={axis} />
              </dd>
              <dd class="quiet">{qualified(place.sheet, place.address)}</dd>
            </div>
          );
        })}
      </dl>
      {problem !== undefined && <p class="wrong">{problem.message}</p>}
      <Counts />
      <details>
        <summary>{readingsWords.edit}</summary>
        <RangeFields />
        <UseSelection name={readingsWords.replace} />
      </details>
    </Section>
  );
}

function Counts() {
  const session = useSession();
  const keyed = valueIn(usePart((state) => state.readings));
  const fit = valueIn(usePart((state) => state.depth)?.fit ?? null);
  const leftOut = useChoice().leftOut.length;
  if (keyed === undefined) return null;
  const { readings } = keyed;
  // With a law chosen, what lies outside of it is set aside as well.
  const aside = fit !== undefined && fit.readings === readings ? fit.setAside : readings.setAside;
  const used = readings.x.length - (aside.length - readings.setAside.length);
  const waiting = Math.max(0, readings.waiting - leftOut);
  const counts = [
    readingsWords.used(used),
    ...(leftOut > 0 ? [readingsWords.leftOut(leftOut)] : []),
    ...(waiting > 0 ? [readingsWords.waiting(waiting)] : []),
  ];
  return (
    <>
      <p class="counts" data-used={used}>
        {counts.map((count, index) => (
          <span key={count} class={index === 0 ? 'strong' : undefined}>
            {count}
          </span>
        ))}
      </p>
      {aside.length > 0 && (
        <details class="aside" open={aside.length <= 3}>
          <summary>{readingsWords.setAside(aside.length)}</summary>
          <ul>
            {aside.slice(0, 200).map((one) => (
              <li key={one.position}>
                <button
                  type="button"
                  class="link"
                  title={readingsWords.showCell(one.position)}
                  onClick={() => void session.showReading(one.position)}
                >
                  {one.message}
                </button>
              </li>
            ))}
          </ul>
        </details>
      )}
    </>
  );
}
