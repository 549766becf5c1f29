import { knownWords, stepWords } from '../../core/words/panelWords.ts';
import { withOption } from '../state/changes.ts';
import { valueIn } from '../state/outcome.ts';
import type { Depth } from '../state/panelState.ts';
import { useChoice, useSession } from './context.ts';
import { percent } from './figures.ts';
import { Choose, Tick } from './parts.tsx';

const COVERAGES: readonly number[] = [0.68, 0.9, 0.95, 0.99, 0.999];

/** How the chosen law is fitted; what stands at its default is not written into formulas. */
export function FitChoices(props: { readonly depth: Depth }) {
  const { depth } = props;
  const session = useSession();
  const { options } = useChoice();
  const forms = valueIn(depth.fit)?.law.forms ?? [];
  const set = (what: string, name: string, value: string | undefined): void =>
    session.change(stepWords.option(what), (choice) => withOption(choice, name, value));
  const tick = (label: string, name: string, value: string) => (
    <Tick
      label={label}
      ticked={options.get(name) === value}
      onTick={(ticked) => set(label.toLowerCase(), name, ticked ? value : undefined)}
    />
  );
  const coverage = options.get('coverage') ?? '0.95';
  const coverages = [...new Set([...COVERAGES.map(String), coverage])].sort();
  return (
    <fieldset class="fit-choices">
      <legend>{knownWords.fit}</legend>
      {forms.length > 1 && (
        <Choose
          label={knownWords.form}
          value={options.get('form') ?? '1'}
          options={forms.map(({ number, plot, against }) => [
            String(number),
            knownWords.formOption(number, plot, against),
          ])}
          onChoose={(value) => set(knownWords.form.toLowerCase(), 'form', value === '1' ? undefined : value)}
        />
      )}
      <Choose
        label={knownWords.coverage}
        value={coverage}
        options={coverages.map((value) => [value, knownWords.coverageOther(percent(Number(value)))])}
        onChoose={(value) =>
          set(knownWords.coverage.toLowerCase(), 'coverage', value === '0.95' ? undefined : value)
        }
      />
      {tick(knownWords.direct, 'fit', 'direct')}
      {tick(knownWords.intercept, 'intercept', 'held')}
      {tick(knownWords.reading, 'band', 'reading')}
      {tick(knownWords.outside, 'outside', 'set aside')}
      {tick(knownWords.montecarlo, 'interval', 'montecarlo')}
      {depth.inputs.get('options') !== undefined && (
        <p class="wrong">{depth.inputs.get('options')?.message}</p>
      )}
    </fieldset>
  );
}
