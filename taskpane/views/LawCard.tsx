import { useMemo } from 'preact/hooks';
import { lawsWords } from '../../core/words/panelWords.ts';
import { LawPlot } from '../plots/LawPlot.tsx';
import type { LawCard as Card } from '../state/panelState.ts';
import { useChoice } from './context.ts';
import { decimals, figures } from './figures.ts';
import { Guard } from './Guard.tsx';
import { Jump } from './Jump.tsx';
import { RemoveLaw } from './RemoveLaw.tsx';

/** One law: its name, its readings on straight axes, and the three figures that judge it; a radio button in all. */
export function LawCard(props: {
  readonly card: Card;
  readonly chosen: boolean;
  readonly onChoose: (law: string) => void;
}) {
  const { card, chosen } = props;
  const { fit, law, support, bowPercent, misfit } = card;
  const { unit } = useChoice().yHeading;
  const caption = fit === null ? '' : lawsWords.plot(fit.form.plot, fit.form.against);
  const plot = useMemo(() => fit !== null && <LawPlot fit={fit} caption={caption} />, [fit, caption]);
  const share = support === '' ? '' : lawsWords.support(decimals(support, support >= 9.95 ? 0 : 1));
  const misfitText = figures(misfit, 2);
  return (
    <div class={`card${chosen ? ' chosen' : ''}`} data-law={law}>
      <label>
        <input
          type="radio"
          class="unseen"
          name="law"
          value={law}
          checked={chosen}
          onChange={() => props.onChoose(law)}
        />
        <span class={law.includes('=') ? 'law-name math' : 'law-name'}>{law}</span>
        <span class="plot">
          <Guard of={fit}>{plot}</Guard>
        </span>
        <span class="axes-name">{caption}</span>
        <span class="figures">
          <span class="figure">
            <span class="figure-name">{lawsWords.supportName}</span>
            <span class="number">{share || lawsWords.none}</span>
            <span class="meter" aria-hidden="true">
              <span style={{ width: `${support === '' ? 0 : support}%` }} />
            </span>
          </span>
          <span class="figure">
            <span class="figure-name">{lawsWords.bowName}</span>
            <span class="number">
              {bowPercent === '' ? lawsWords.none : lawsWords.support(decimals(bowPercent, 1))}
            </span>
          </span>
          <span class="figure">
            <span class="figure-name">{lawsWords.misfitName}</span>
            <span class="number">
              {misfitText === '' ? lawsWords.none : `${misfitText}${unit === '' ? '' : ` ${unit}`}`}
            </span>
          </span>
        </span>
      </label>
      {chosen && <Jump to="depth" kind="deeper" name={lawsWords.deeper} />}
      <RemoveLaw law={law} />
    </div>
  );
}
