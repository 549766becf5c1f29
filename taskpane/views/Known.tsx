import { knownWords, stepWords } from '../../core/words/panelWords.ts';
import { withKnown } from '../state/changes.ts';
import { valueIn } from '../state/outcome.ts';
import type { Depth } from '../state/panelState.ts';
import { useChoice, useSession } from './context.ts';
import { FitChoices } from './FitChoices.tsx';
import { figures } from './figures.ts';
import { Field, Part } from './parts.tsx';
import { Spread } from './Spread.tsx';

/** What the user knows beforehand: constants, uncertainties of the readings, and how to fit. */
export function Known(props: { readonly depth: Depth }) {
  const { depth } = props;
  const session = useSession();
  const { known, xHeading, yHeading } = useChoice();
  const fit = valueIn(depth.fit);
  return (
    <Part title={knownWords.title}>
      <fieldset class="known">
        <legend>{knownWords.constants}</legend>
        <p class="hint">{knownWords.constantsHelp}</p>
        <div class="known-fields">
          {(fit?.law.constants ?? depth.constants).map((name) => {
            const builtIn = fit?.law.builtIn.get(name);
            const own = known.find((entry) => entry.name === name)?.text ?? '';
            return (
              <Field
                key={name}
                label={name}
                math
                value={own}
                placeholder={
                  builtIn === undefined ? knownWords.found : knownWords.builtIn(figures(builtIn, 10))
                }
                problem={depth.inputs.get(`known:${name}`)?.message}
                onCommit={(text) =>
                  session.change(stepWords.known(name), (choice) => withKnown(choice, name, text))
                }
              />
            );
          })}
        </div>
      </fieldset>
      <Spread axis="y" name={yHeading.name} problem={depth.inputs.get('u_y')?.message} />
      <Spread axis="x" name={xHeading.name} problem={depth.inputs.get('u_x')?.message} />
      <FitChoices depth={depth} />
    </Part>
  );
}
