import type { Book } from './book.ts';
import { EXCEL_ENUMERATIONS } from './enumerations.ts';
import { application } from './excel/application.ts';
import { workbook } from './excel/workbook.ts';
import { notImplemented } from './hostError.ts';
import { contextBehind, contextProxy, Remote, remoteBehind } from './remote.ts';
import { RequestContext } from './requestContext.ts';

/** Opens a context whose face offers `workbook`, `application` and `sync`. */
export function openContext(book: Book): object {
  const context = new RequestContext(book);
  return contextProxy(context, () => ({
    workbook: new Remote(context, workbook, () => ({ book })).proxy,
    application: new Remote(context, application, () => ({ book })).proxy,
  }));
}

type Batch = (context: object) => unknown;

/** Makes the `Excel` global over a workbook. */
export function createExcel(book: Book): object {
  const run = async (first: unknown, second?: unknown): Promise<unknown> => {
    // The last argument is the batch; what stands before it names a context to go on with.
    const batch = (second ?? first) as Batch;
    if (typeof batch !== 'function') throw new TypeError('Excel.run needs a function');
    const known = second === undefined ? null : contextOf(first);
    const face = known ? contextProxy(known) : openContext(book);
    const result = await batch(face);
    await contextBehind(face)?.sync();
    return result;
  };
  // Called with `new`.
  const openNew = function open() {
    return openContext(book);
  };
  const members: Readonly<Record<string, unknown>> = {
    run,
    RequestContext: openNew,
    ...EXCEL_ENUMERATIONS,
  };
  return strictObject('Excel', members);
}

function contextOf(given: unknown): RequestContext | null {
  const one: unknown = Array.isArray(given) ? given[0] : given;
  return contextBehind(one) ?? remoteBehind(one)?.context ?? null;
}

/** An object that says so when it is asked for a member it lacks. */
export function strictObject(name: string, members: Readonly<Record<string, unknown>>): object {
  return new Proxy(members, {
    get(target, member) {
      if (typeof member === 'symbol' || member === 'then' || member === 'toJSON') return undefined;
      if (Object.hasOwn(target, member)) return target[member];
      throw notImplemented(`${name}.${member}`);
    },
    has: (target, member) => Object.hasOwn(target, member),
  });
}
