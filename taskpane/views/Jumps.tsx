import { panelWords } from '../../core/words/panelWords.ts';

const places = ['readings', 'laws', 'depth'] as const;

/** Ways to the sections, for a panel too narrow to show them beside each other. */
export function Jumps() {
  return (
    <nav class="jumps" aria-label={panelWords.jump}>
      {places.map((id) => (
        <a
          key={id}
          href={`#${id}`}
          onClick={(event) => {
            // A host's panel has no history of addresses: go there without one.
            event.preventDefault();
            const heading = document.getElementById(`${id}-title`);
            heading?.scrollIntoView();
            heading?.focus({ preventScroll: true });
          }}
        >
          {panelWords.jumps[id]}
        </a>
      ))}
    </nav>
  );
}
