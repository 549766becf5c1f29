/** Takes the README's pictures anew: node build.mjs && node test/docs/pictures.mjs */
import { loadTypeScript } from '../../manifest-template/loadTypeScript.mjs';

const { takePictures } = await loadTypeScript('test/docs/takePictures.ts');
await takePictures();
