import type { Fit } from '../../core/fit/fit.ts';
import { handoverWords } from '../../core/words/handoverWords.ts';
import { plotPicture } from '../plots/picture.ts';
import type { Choice } from '../state/choice.ts';
import { curveTitles, straightTitles } from './axisTitles.ts';
import { type CardPicture, PICTURE } from './pictures.ts';
import { rasterise } from './rasterise.ts';

/** Draws the card's pictures: the straight axes and, where the law can be drawn, the curve. */
export async function cardPictures(choice: Choice, fit: Fit): Promise<CardPicture[]> {
  const kinds = fit.law.curve === null ? (['straight'] as const) : (['straight', 'curve'] as const);
  const pictures: CardPicture[] = [];
  for (const kind of kinds) {
    const titles = kind === 'straight' ? straightTitles(choice, fit) : curveTitles(choice, fit);
    const svg = plotPicture(fit, kind, { ...PICTURE, ...titles });
    if (svg === '') continue;
    const description = kind === 'straight' ? handoverWords.straightPicture : handoverWords.curvePicture;
    pictures.push({ base64: await rasterise(svg, PICTURE), description });
  }
  return pictures;
}
