import type { Book } from './book.ts';
import { createExcel } from './excelGlobal.ts';
import { createOffice, type OfficeOptions, officeExtension } from './officeGlobal.ts';

/** The globals that a host gives an add-in's page, besides `CustomFunctions`. */
export interface HostGlobals {
  readonly Office: object;
  readonly Excel: object;
  readonly OfficeExtension: object;
}

/** Makes the host's globals over a workbook. */
export function createHost(book: Book, options: Partial<OfficeOptions> = {}): HostGlobals {
  const office = createOffice(book, {
    theme: 'light',
    displayLanguage: 'en-US',
    excelApi: '1.12',
    showPanel: () => undefined,
    ...options,
  });
  return { Office: office, Excel: createExcel(book), OfficeExtension: officeExtension };
}
