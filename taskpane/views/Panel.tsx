import { panelWords } from '../../core/words/panelWords.ts';
import { hasReadings } from '../state/noChoice.ts';
import { usePart } from './context.ts';
import { Depth } from './Depth.tsx';
import { Head } from './Head.tsx';
import { Jumps } from './Jumps.tsx';
import { Laws } from './Laws.tsx';
import { Notice } from './Notice.tsx';
import { Readings } from './Readings.tsx';
import { Start } from './Start.tsx';

/** The whole side panel. */
export function Panel() {
  const opened = usePart((state) => state.opened);
  const ready = usePart((state) => hasReadings(state.history.present));
  const said = usePart((state) => state.said);
  return (
    <>
      <div class="top">
        <Head />
        {ready && <Jumps />}
      </div>
      <Notice />
      {!opened && <p class="quiet">{panelWords.opening}</p>}
      {opened && !ready && (
        <main>
          <Start />
        </main>
      )}
      {opened && ready && (
        <main class="columns">
          <div class="column">
            <Readings />
            <Laws />
          </div>
          <div class="column">
            <Depth />
          </div>
        </main>
      )}
      <p class="unseen" role="status">
        {said}
      </p>
    </>
  );
}
