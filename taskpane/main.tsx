import { render } from 'preact';
import { hostWords } from '../core/words/panelWords.ts';
import { excelWorkbook } from './host/excelWorkbook.ts';
import { wearTheme } from './host/theme.ts';
import { createSession } from './state/session.ts';
import { SessionContext } from './views/context.ts';
import { Panel } from './views/Panel.tsx';

async function start(): Promise<void> {
  const place = document.getElementById('panel');
  if (place === null) throw new Error('the page has no #panel');
  const { host } = await Office.onReady();
  if (host !== Office.HostType.Excel) {
    place.textContent = hostWords.noHost();
    return;
  }
  wearTheme(document.documentElement);
  const session = createSession(excelWorkbook);
  window.addEventListener('unhandledrejection', (event) => session.warn(event.reason));
  document.addEventListener('keydown', (event) => {
    // Inside a text field the keys take back letters, as everywhere.
    if (!(event.ctrlKey || event.metaKey) || event.altKey || isTextField(event.target)) return;
    const key = event.key.toLowerCase();
    if (key === 'y' || (key === 'z' && event.shiftKey)) session.redo();
    else if (key === 'z') session.undo();
    else return;
    event.preventDefault();
  });
  render(
    <SessionContext.Provider value={session}>
      <Panel />
    </SessionContext.Provider>,
    place,
  );
}

function isTextField(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLTextAreaElement ||
    (target instanceof HTMLInputElement && !['radio', 'checkbox'].includes(target.type))
  );
}

void start();
