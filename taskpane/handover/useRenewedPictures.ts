import { useEffect } from 'preact/hooks';
import type { Fit } from '../../core/fit/fit.ts';
import { Problem } from '../../core/problem.ts';
import { HostTrouble, type Workbook } from '../host/workbook.ts';
import type { Choice } from '../state/choice.ts';
import { cardPictures } from './cardPictures.ts';
import { renewPictures } from './pictures.ts';
import { readsAs } from './readsAs.ts';
import type { Placed } from './records.ts';
import { wholeFit } from './wholeFit.ts';

/** Readings that are typed one after the other renew the pictures once, after this time in milliseconds. */
const SETTLE = 600;

/** Draws the pictures of live cards of this choice anew whenever the fit changes: a picture has no formulas. */
export function useRenewedPictures(
  placed: readonly Placed[],
  choice: Choice,
  fit: Fit,
  workbook: Workbook,
): void {
  const live = placed.filter(
    (one) => one.shapes.length > 0 && one.frozen === null && readsAs(one.of, choice),
  );
  const wanted = live.map(({ id }) => id).join(' ');
  // biome-ignore lint/correctness/useExhaustiveDependencies: which cards are live is what `wanted` says
  useEffect(() => {
    if (wanted === '') return;
    const timer = setTimeout(() => {
      void renew(workbook, live, choice).catch((error: unknown) => {
        // A card that was deleted in the sheet has no pictures to renew; while a cell is edited, or readings that the
        // law cannot take are in the cells, the next change does it.
        const passes = error instanceof HostTrouble && (error.kind === 'gone' || error.kind === 'busy');
        if (!passes && !(error instanceof Problem)) throw error;
      });
    }, SETTLE);
    return () => clearTimeout(timer);
  }, [wanted, fit, workbook]);
}

async function renew(workbook: Workbook, live: readonly Placed[], choice: Choice): Promise<void> {
  const drawn = await cardPictures(choice, await wholeFit(workbook, choice));
  await workbook.run(async (context) => {
    for (const { areaName, shapes } of live) {
      const sheet = context.workbook.names.getItem(areaName).getRange().worksheet;
      await renewPictures(context, sheet, drawn, shapes);
    }
  });
}
