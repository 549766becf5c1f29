import { resolve } from 'node:path';
import { bundleScript, bundleStyle } from '../../../../manifest-template/bundleScripts.ts';

const ROOT = resolve();

const OWN_STYLE = `
  main { max-width: none; padding: 10px; display: grid; gap: 12px; }
  h1, h2 { font-size: 13px; margin: 0; }
  .laws { display: flex; flex-wrap: wrap; gap: 10px; }
  .law { width: 150px; }
  section { display: grid; gap: 6px; min-width: 0; }
`;

/** A page with every plot of the gallery, complete in itself; bundled as the panel is. */
export async function galleryPage(): Promise<string> {
  const [script, style] = await Promise.all([
    bundleScript(ROOT, 'test/taskpane/plots/gallery/gallery.tsx'),
    bundleStyle(ROOT, 'taskpane/style.css'),
  ]);
  const code = script.text.replaceAll('</script', '<\\/script');
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>Plots</title>
<style>${style.text}${OWN_STYLE}</style></head><body><div id="gallery"></div><script>${code}</script></body></html>`;
}
