import { lawsWords, stepWords } from '../../core/words/panelWords.ts';
import { withLaw } from '../state/changes.ts';
import { useChoice, usePart, useSession } from './context.ts';
import { LawCard } from './LawCard.tsx';
import { OwnLaw } from './OwnLaw.tsx';
import { Section } from './parts.tsx';
import { RemoveLaw } from './RemoveLaw.tsx';
import { TradeLaw } from './TradeLaw.tsx';

/** Every law on its own straight axes, the best supported first. */
export function Laws() {
  const session = useSession();
  const { law: chosen } = useChoice();
  const cards = usePart((state) => state.cards);
  const stopped = usePart((state) => state.comparisonStopped);
  const possible = cards.filter((card) => card.fit !== null);
  const impossible = cards.filter((card) => card.fit === null);
  const choose = (law: string): void =>
    session.change(stepWords.law(law), (current) => (current.law === law ? current : withLaw(current, law)));
  return (
    <Section id="laws" title={lawsWords.title}>
      <p class="lead">{lawsWords.lead}</p>
      <Progress />
      {stopped !== '' && <p class="wrong">{stopped}</p>}
      {possible.length > 0 && (
        <fieldset class="cards">
          <legend class="unseen">{lawsWords.choose}</legend>
          {possible.map((card) => (
            <LawCard key={card.law} card={card} chosen={card.law === chosen} onChoose={choose} />
          ))}
        </fieldset>
      )}
      {impossible.length > 0 && (
        <details class="impossible">
          <summary>{lawsWords.impossible(impossible.length)}</summary>
          <dl>
            {impossible.map((card) => (
              <div key={card.law}>
                <dt>
                  {card.law} <RemoveLaw law={card.law} />
                </dt>
                <dd>{card.reason}</dd>
              </div>
            ))}
          </dl>
        </details>
      )}
      {possible.length > 0 && possible.every(({ support }) => support === '') && (
        <p class="hint">{lawsWords.noSupport}</p>
      )}
      <details class="explain">
        <summary>{lawsWords.explain}</summary>
        <p>{lawsWords.explainSupport}</p>
        <p>{lawsWords.explainBow}</p>
        <p>{lawsWords.explainMisfit}</p>
      </details>
      <OwnLaw />
      <TradeLaw />
    </Section>
  );
}

function Progress() {
  const session = useSession();
  const progress = usePart((state) => state.progress);
  const compared = usePart((state) => state.compared);
  if (progress !== null) {
    const words = lawsWords.progress(progress.done, progress.total);
    return (
      <div class="progress">
        <label>
          {words}
          <progress value={progress.done} max={progress.total} />
        </label>
        <button type="button" onClick={() => session.cancel()}>
          {lawsWords.cancel}
        </button>
      </div>
    );
  }
  if (compared) return null;
  return (
    <div class="progress">
      <p>{lawsWords.cancelled}</p>
      <button type="button" onClick={() => session.compareAgain()}>
        {lawsWords.resume}
      </button>
    </div>
  );
}
