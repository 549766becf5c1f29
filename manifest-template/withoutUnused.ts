import type { Plugin } from 'esbuild';

/** What the plotting library brings along for maps and colour schemes, which no plot here has. */
const UNUSED = /[\\/]node_modules[\\/](d3-geo|d3-scale-chromatic)[\\/]/;

/** Called when the library is loaded; everything else only by a plot that asks for it. */
const CALLED_AT_LOAD = 'geoTransform';

/**
 * Leaves those parts out of a bundle, 17 KB of it after gzip. A plot that came to need one of them would stop with an
 * error that names it, when it is drawn.
 */
export const withoutUnused: Plugin = {
  name: 'without unused',
  setup({ onLoad, esbuild }) {
    onLoad({ filter: UNUSED }, async ({ path }) => {
      const { metafile } = await esbuild.build({
        entryPoints: [path],
        bundle: true,
        write: false,
        metafile: true,
        format: 'esm',
        outfile: 'names.js',
        logLevel: 'silent',
      });
      const names = Object.values(metafile.outputs).flatMap((output) => output.exports);
      const lines = names.map((name) =>
        name === CALLED_AT_LOAD
          ? `export const ${name} = () => ({});`
          : `export const ${name} = leftOut(${JSON.stringify(name)});`,
      );
      const leftOut =
        'const leftOut = (name) => () => { throw new Error(name + " is not in this bundle"); };';
      return { contents: [leftOut, ...lines].join('\n'), loader: 'js' };
    });
  },
};
