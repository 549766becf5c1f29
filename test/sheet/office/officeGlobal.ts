import type { Book } from './book.ts';
import { strictObject } from './excelGlobal.ts';
import { HostError } from './hostError.ts';

export interface OfficeOptions {
  /** The host's theme; null: none is told, as on some hosts. */
  readonly theme: 'light' | 'dark' | 'contrast' | null;
  readonly displayLanguage: string;
  /** The newest set of the workbook's object model that is supported, such as 1.12. */
  readonly excelApi: string;
  /** Shows or hides the panel. */
  showPanel(shown: boolean): void;
}

const THEMES = {
  light: {
    bodyBackgroundColor: '#FFFFFF',
    bodyForegroundColor: '#242424',
    controlBackgroundColor: '#FAFAFA',
    controlForegroundColor: '#242424',
    isDarkTheme: false,
  },
  dark: {
    bodyBackgroundColor: '#1F1F1F',
    bodyForegroundColor: '#F0F0F0',
    controlBackgroundColor: '#2B2B2B',
    controlForegroundColor: '#F0F0F0',
    isDarkTheme: true,
  },
  contrast: {
    bodyBackgroundColor: '#000000',
    bodyForegroundColor: '#FFFFFF',
    controlBackgroundColor: '#000000',
    controlForegroundColor: '#FFFFFF',
    isDarkTheme: true,
  },
} as const;

/** Makes the `Office` global. */
export function createOffice(book: Book, options: OfficeOptions): object {
  const info = { host: 'Excel', platform: 'OfficeOnline' };
  const supported: Readonly<Record<string, string>> = {
    ExcelApi: options.excelApi,
    SharedRuntime: '1.1',
    CustomFunctionsRuntime: '1.4',
    DialogApi: '1.1',
    RibbonApi: '1.1',
  };
  const succeed = (callback: unknown, value?: unknown): void => {
    if (typeof callback === 'function') book.later(() => callback({ status: 'succeeded', value }));
  };
  const settings = strictObject('Office.context.document.settings', {
    get: (key: string) => structuredClone(book.settings.get(key)) ?? null,
    set: (key: string, value: unknown) => void book.settings.set(key, structuredClone(value)),
    remove: (key: string) => void book.settings.delete(key),
    saveAsync: (first?: unknown, second?: unknown) => {
      book.keepSettings();
      succeed(second ?? first);
    },
    refreshAsync: (callback?: unknown) => succeed(callback),
  });
  const context = strictObject('Office.context', {
    ...info,
    document: strictObject('Office.context.document', { settings, url: 'Demo.xlsx', mode: 'readWrite' }),
    officeTheme: options.theme === null ? undefined : THEMES[options.theme],
    displayLanguage: options.displayLanguage,
    contentLanguage: options.displayLanguage,
    touchEnabled: false,
    diagnostics: { ...info, version: '16.0.0.0' },
    requirements: strictObject('Office.context.requirements', {
      isSetSupported: (name: string, version = '1.1') => {
        const newest = supported[name];
        return newest !== undefined && minor(version) <= minor(newest);
      },
    }),
  });
  const visibility = new Set<(message: object) => void>();
  let startup = 'None';
  const show = (shown: boolean) => {
    options.showPanel(shown);
    for (const handler of visibility)
      book.later(() => handler({ visibilityMode: shown ? 'Taskpane' : 'Hidden' }));
    return Promise.resolve();
  };
  const office: Record<string, unknown> = {
    context,
    onReady: (callback?: (told: object) => unknown) =>
      book.roundTrip().then(() => {
        callback?.({ ...info });
        return { ...info };
      }),
    initialize: () => undefined,
    isSetSupported: () => false,
    HostType: { Excel: 'Excel', Word: 'Word', PowerPoint: 'PowerPoint', Outlook: 'Outlook' },
    PlatformType: {
      PC: 'PC',
      OfficeOnline: 'OfficeOnline',
      Mac: 'Mac',
      iOS: 'iOS',
      Android: 'Android',
      Universal: 'Universal',
    },
    AsyncResultStatus: { Succeeded: 'succeeded', Failed: 'failed' },
    StartupBehavior: { none: 'None', load: 'Load' },
    VisibilityMode: { hidden: 'Hidden', taskpane: 'Taskpane' },
    actions: strictObject('Office.actions', { associate: () => undefined }),
    addin: strictObject('Office.addin', {
      showAsTaskpane: () => show(true),
      hide: () => show(false),
      onVisibilityModeChanged: (handler: (message: object) => void) => {
        visibility.add(handler);
        return Promise.resolve(() => Promise.resolve(void visibility.delete(handler)));
      },
      setStartupBehavior: (behaviour: string) => {
        startup = behaviour;
        return Promise.resolve();
      },
      getStartupBehavior: () => Promise.resolve(startup),
    }),
  };
  return new Proxy(strictObject('Office', office), {
    // An add-in may still assign Office.initialize.
    set: (_, name, value) => {
      if (name !== 'initialize' || typeof value !== 'function') return false;
      office['initialize'] = value as unknown;
      book.later(() => value('documentOpened'));
      return true;
    },
  });
}

function minor(version: string): number {
  const [major = 0, second = 0] = version.split('.').map(Number);
  return major * 1000 + second;
}

/** The `OfficeExtension` global: the class of the errors that batches reject with. */
export const officeExtension = {
  Error: HostError,
  ErrorCodes: { accessDenied: 'AccessDenied', generalException: 'GeneralException' },
};
