import { render } from 'preact';
import { useState } from 'preact/hooks';
import { CurvePlot } from '../../../../taskpane/plots/CurvePlot.tsx';
import { LawPlot } from '../../../../taskpane/plots/LawPlot.tsx';
import { plotPicture } from '../../../../taskpane/plots/picture.ts';
import { ResidualPlot } from '../../../../taskpane/plots/ResidualPlot.tsx';
import { StraightPlot } from '../../../../taskpane/plots/StraightPlot.tsx';
import { evenly, fitOf, type GalleryFit, galleryFits } from './fits.ts';

const fits = galleryFits();

function Gallery() {
  return (
    <main>
      <h1>Plots</h1>
      <div class="laws">
        {fits.map(({ id, fit }) => (
          <div class="law" key={id}>
            <LawPlot fit={fit} caption={`${fit.form.plot} against ${fit.form.against}, ${id}`} />
          </div>
        ))}
      </div>
      {fits.map((row) => (
        <Row key={row.id} row={row} />
      ))}
    </main>
  );
}

function Row({ row }: { readonly row: GalleryFit }) {
  const [selected, setSelected] = useState<number | null>(null);
  const { id, fit, straight, sheet } = row;
  const shared = { fit, selected, onSelect: setSelected };
  return (
    <section id={id} data-selected={selected ?? ''}>
      <h2>{id}</h2>
      <div class="straight">
        <StraightPlot {...shared} {...straight} />
      </div>
      <div class="residual">
        <ResidualPlot {...shared} {...straight} />
      </div>
      <div class="curve">
        <CurvePlot {...shared} {...sheet} band={fit.settings.options.band} />
      </div>
    </section>
  );
}

/** What a test asks the page for. */
const asked = {
  picture(id: string, kind: 'straight' | 'curve'): string {
    const row = fits.find((candidate) => candidate.id === id);
    if (row === undefined) throw new Error(`there is no ${id}`);
    const titles = kind === 'straight' ? row.straight : row.sheet;
    return plotPicture(row.fit, kind, { width: 440, height: 300, ...titles });
  },
  /** A picture whose titles hold what a cell may: marks that mean something in XML, and a hard space. */
  hostilePicture(): string {
    const fit = fitOf('straight line', evenly(1, 5, 5), (x, e) => x + 0.1 * e);
    return plotPicture(fit, 'straight', {
      width: 300,
      height: 200,
      xTitle: 'a < b & "c"\u00a0/ s',
      yTitle: '</svg>',
    });
  },
};

Reflect.set(window, 'gallery', asked);
const place = document.querySelector('#gallery');
if (place !== null) render(<Gallery />, place);
