import './page.css';
import { demoWorkbook } from '../demo/workbook.ts';
import type { FunctionsMetadata } from '../grid/customFunctions.ts';
import { attachCharts } from '../office/attachCharts.ts';
import { Book } from '../office/book.ts';
import { createSheet } from './createSheet.ts';
import { attachInspector } from './inspector.ts';
import { attachSplitter } from './splitter.ts';
import type { StandIn } from './standIn.ts';

const SETTINGS_KEY = 'stand-in workbook settings';
const parameters = new URLSearchParams(location.search);
const EMPTY = {
  name: 'Sheet1',
  columnWidths: [],
  frozenRows: 0,
  blocks: {},
  styles: {},
  numberFormats: {},
  followed: { typed: 'A1', x: 'A1', y: 'A1', constants: 'A1', laws: '', more: '' },
};

function element<T extends HTMLElement>(id: string, type: new () => T): T {
  const found = document.getElementById(id);
  if (!(found instanceof type)) throw new Error(`the page lacks #${id}`);
  return found;
}

/** A choice in the bar that opens the page anew with another parameter. */
function choice(id: string, options: Readonly<Record<string, string>>, initial: string): string {
  const select = element(id, HTMLSelectElement);
  const chosen = parameters.get(id) ?? initial;
  for (const [value, text] of Object.entries(options)) {
    select.add(new Option(text, value, value === chosen, value === chosen));
  }
  select.addEventListener('change', () => {
    parameters.set(id, select.value);
    location.search = parameters.toString();
  });
  return chosen;
}

async function declarations(): Promise<FunctionsMetadata> {
  const answer = await fetch('/add-in/functions.json');
  if (!answer.ok) return { functions: [] };
  // Written by the build and checked by its own tests.
  return (await answer.json()) as FunctionsMetadata;
}

async function open(): Promise<void> {
  const blank = choice('blank', { null: 'null (newer hosts)', zero: '0 (older hosts)' }, 'null');
  const theme = choice(
    'theme',
    { light: 'light', dark: 'dark', contrast: 'high contrast', none: 'not told' },
    'light',
  );
  const metadata = await declarations();
  const { grid } = createSheet('sheet', parameters.has('empty') ? [EMPTY] : demoWorkbook);
  const book = new Book(grid, {
    // Settings are JSON that this page wrote itself.
    read: () => JSON.parse(localStorage.getItem(SETTINGS_KEY) ?? '{}') as Record<string, unknown>,
    write: (settings) => localStorage.setItem(SETTINGS_KEY, JSON.stringify(settings)),
  });
  attachCharts(book);
  attachInspector(grid);
  const desk = document.querySelector('.desk');
  const toggle = element('panel-toggle', HTMLButtonElement);
  const showPanel = (shown: boolean) => {
    desk?.classList.toggle('panel-hidden', !shown);
    toggle.setAttribute('aria-expanded', String(shown));
  };
  toggle.addEventListener('click', () => showPanel(toggle.getAttribute('aria-expanded') !== 'true'));
  attachSplitter(element('splitter', HTMLElement), Number(parameters.get('panel') ?? 350));

  const standIn: StandIn = {
    grid,
    book,
    blank: blank === 'zero' ? 'zero' : 'null',
    theme: theme === 'dark' || theme === 'contrast' || theme === 'light' ? theme : null,
    metadata,
    namespace: 'TAUT',
    showPanel,
  };
  window.standIn = standIn;
  const sheet = grid.sheets().find((one) => one.name === parameters.get('sheet'));
  if (sheet) grid.activateSheet(sheet.id);
  // The add-in's page owns the functions, as in a host's shared runtime: its frame loads them once.
  if (!parameters.has('noaddin')) element('panel-frame', HTMLIFrameElement).src = '/add-in/taskpane.html';
}

void open();
