import { panelWords } from '../../core/words/panelWords.ts';
import { Jump } from './Jump.tsx';

const places = ['readings', 'laws', 'depth'] as const;

/** Ways to the sections, for a panel too narrow to show them beside each other. */
export function Jumps() {
  return (
    <nav class="jumps" aria-label={panelWords.jump}>
      {places.map((id) => (
        <Jump key={id} to={id} name={panelWords.jumps[id]} />
      ))}
    </nav>
  );
}
