/**
 * Takes the place of the vendor's script in the add-in's page: supplies `Office`, `Excel`, `OfficeExtension` and
 * `CustomFunctions` over the sheet of the page around it. Runs in the add-in's own frame, so that promises and errors
 * are that page's own.
 */
import { createCustomFunctions } from '../grid/customFunctions.ts';
import { createHost } from '../office/host.ts';
import type { StandIn } from './standIn.ts';

// The page around this one is the stand-in's own.
const standIn = (window.parent as Window & { standIn?: StandIn }).standIn;
if (!standIn) throw new Error('the stand-in sheet is not around this page');

const { grid, book, namespace, metadata, blank, theme, showPanel } = standIn;
const { customFunctions, revealErrors } = createCustomFunctions(grid, namespace, metadata, blank);
Object.assign(window, createHost(book, { theme, showPanel }), { CustomFunctions: customFunctions });
// On a host the error class appears after the scripts have registered their functions.
window.addEventListener('DOMContentLoaded', () => {
  revealErrors();
  grid.recalculate();
});
window.addEventListener('pagehide', () => book.closePage());

const refuse = (name: string) => () => {
  throw new Error(`${name} is not supported in a panel`);
};
// A panel has no dialogs of the browser's own and no history.
Object.assign(window, { alert: refuse('alert'), confirm: refuse('confirm'), prompt: refuse('prompt') });
Object.defineProperty(window.history, 'pushState', { value: null });
Object.defineProperty(window.history, 'replaceState', { value: null });
