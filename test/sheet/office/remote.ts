import { HostError, notImplemented, propertyNotLoaded, valueNotLoaded } from './hostError.ts';
import type { RequestContext } from './requestContext.ts';

/** A loadable property of a host object, read from and written to what the proxy stands for. */
export interface Property<T> {
  get(target: T): unknown;
  set?(target: T, value: unknown): void;
  /** Whether setting it changes cells that may have to be calculated. */
  readonly writesCells?: boolean;
  /** Whether reading it needs calculated cells. */
  readonly readsCells?: boolean;
}

/** How one type of host object behaves: the stand-in's strict counterpart of a proxy class. */
export interface Definition<T> {
  readonly type: string;
  readonly properties?: Readonly<Record<string, Property<T>>>;
  /** Objects reached through a property, such as `range.format`. */
  readonly links?: Readonly<Record<string, (self: Remote<T>) => unknown>>;
  readonly methods?: Readonly<Record<string, (self: Remote<T>, ...given: readonly unknown[]) => unknown>>;
  /** Subscribes to an event; returns what ends the subscription. */
  readonly events?: Readonly<
    Record<string, (self: Remote<T>, target: T, send: (event: object) => void) => () => void>
  >;
  /** For a collection: its present members. */
  readonly items?: Items<T>;
}

export interface Items<T> {
  list(self: Remote<T>, target: T): Remote<never>[];
}

export interface ClientResult<V> {
  readonly value: V;
}

const remotes = new WeakMap<object, Remote<never>>();

/** The object behind a proxy that the add-in handed back as an argument, if it is one. */
export function remoteBehind(value: unknown): Remote<never> | null {
  return typeof value === 'object' && value !== null ? (remotes.get(value) ?? null) : null;
}

/** The far end of one proxy object: what it stands for is found when the batch is synchronised. */
export class Remote<T> {
  readonly context: RequestContext;
  readonly definition: Definition<T>;
  readonly proxy: object;
  private readonly find: () => T | null;
  private readonly loaded = new Map<string, unknown>();
  private readonly reached = new Map<string, unknown>();
  private found: { readonly target: T | null } | null = null;
  private loadedItems: object[] | null = null;
  private nullness: boolean | null = null;

  constructor(context: RequestContext, definition: Definition<T>, find: () => T | null) {
    this.context = context;
    this.definition = definition;
    this.find = find;
    this.proxy = strictProxy(this);
    // Only ever handed to code that checks the definition before it touches the target.
    remotes.set(this.proxy, this as unknown as Remote<never>);
  }

  /** What the proxy stands for, or null for a null object. Only while a batch runs. */
  peek(): T | null {
    this.found ??= { target: this.find() };
    this.nullness = this.found.target === null;
    return this.found.target;
  }

  /** What the proxy stands for. @throws when it is a null object. */
  target(): T {
    const target = this.peek();
    if (target === null) {
      throw new HostError(
        'InvalidObjectPath',
        'The object is a null object: check isNullObject first.',
        this.definition.type,
      );
    }
    return target;
  }

  /** A proxy for an object found from this one's; `queued` finds it in its turn, as a method call does. */
  child<U>(definition: Definition<U>, find: (target: T) => U | null, queued = true): object {
    const child = new Remote<U>(this.context, definition, () => {
      const target = this.peek();
      return target === null ? null : find(target);
    });
    if (queued) {
      const name = `${this.definition.type}→${definition.type}`;
      this.context.enqueue({ name, reads: false, writes: false, run: () => void child.peek() });
    }
    return child.proxy;
  }

  /** Queues something to be done to the object. */
  act(name: string, run: (target: T) => void | Promise<void>, writes = false): void {
    this.context.enqueue({
      name: `${this.definition.type}.${name}`,
      reads: false,
      writes,
      run: () => run(this.target()),
    });
  }

  /** Queues a question; the answer's `value` may be read after the batch. */
  ask<V>(name: string, answer: (target: T) => V): ClientResult<V> {
    let held: { readonly value: V } | null = null;
    this.context.enqueue({
      name: `${this.definition.type}.${name}`,
      reads: true,
      writes: false,
      run: () => {
        held = { value: answer(this.target()) };
      },
    });
    return {
      get value(): V {
        if (!held) throw valueNotLoaded();
        return held.value;
      },
    };
  }

  read(name: string): unknown {
    const { type, properties, links, methods, events, items } = this.definition;
    if (name === 'context') return contextProxy(this.context);
    if (name === 'isNullObject') {
      if (this.nullness === null) throw propertyNotLoaded('isNullObject');
      return this.nullness;
    }
    if (name === 'load') return (what?: unknown) => this.load(what);
    if (name === 'set') return (values: unknown) => this.setAll(values);
    if (name === 'track' || name === 'untrack') return () => this.proxy;
    if (name === 'toJSON') return () => this.toJSON();
    if (name === 'items' && items) {
      if (!this.loadedItems) throw propertyNotLoaded('items');
      return this.loadedItems;
    }
    if (own(properties, name)) {
      if (!this.loaded.has(name)) throw propertyNotLoaded(name);
      return this.loaded.get(name);
    }
    const link = own(links, name);
    if (link) {
      if (!this.reached.has(name)) this.reached.set(name, link(this));
      return this.reached.get(name);
    }
    const method = own(methods, name);
    if (method) return (...given: unknown[]) => method(this, ...given);
    if (own(events, name)) return this.eventSource(name);
    throw notImplemented(`${type}.${name}`);
  }

  write(name: string, value: unknown): void {
    const property = own(this.definition.properties, name);
    const { set } = property ?? {};
    if (!set) throw notImplemented(`setting ${this.definition.type}.${name}`);
    this.loaded.set(name, value);
    this.act(`${name}=`, (target) => set(target, value), property?.writesCells ?? false);
  }

  load(what?: unknown): object {
    for (const path of pathsOf(what)) this.loadPath(path);
    return this.proxy;
  }

  private loadPath(path: string): void {
    const [first = '', ...rest] = path.split(/[/.]/).map((part) => part.trim());
    const { type, properties, links, items } = this.definition;
    if (items) {
      const inner = first === 'items' ? rest.join('/') : path;
      if (own(properties, first)) this.loadNames([first]);
      else this.loadItems(inner);
      return;
    }
    if (first === '' || first === '$all') {
      this.loadNames(Object.keys(properties ?? {}));
    } else if (own(properties, first)) {
      this.loadNames([first]);
    } else if (own(links, first)) {
      remoteBehind(this.read(first))?.load(rest.join('/'));
    } else if (first !== 'isNullObject') {
      throw notImplemented(`loading ${type}.${first}`);
    }
  }

  private loadNames(names: readonly string[]): void {
    const properties = this.definition.properties ?? {};
    this.context.enqueue({
      name: `${this.definition.type}.load`,
      reads: names.some((name) => properties[name]?.readsCells),
      writes: false,
      run: () => {
        const target = this.peek();
        if (target === null) return;
        for (const name of names) this.loaded.set(name, properties[name]?.get(target));
      },
    });
  }

  private loadItems(inner: string): void {
    this.context.enqueue({
      name: `${this.definition.type}.load`,
      reads: false,
      writes: false,
      run: async () => {
        const target = this.peek();
        if (target === null || !this.definition.items) return;
        const members = this.definition.items.list(this, target);
        for (const member of members) await member.loadNow(inner);
        this.loadedItems = members.map((member) => member.proxy);
      },
    });
  }

  /** Loads while the batch runs, for members of a collection that exist only now. */
  private async loadNow(path: string): Promise<void> {
    const [first = '', ...rest] = path.split(/[/.]/);
    const target = this.target();
    const properties = this.definition.properties ?? {};
    const link = own(this.definition.links, first);
    if (link) {
      const reached = remoteBehind(this.read(first));
      if (reached) await reached.loadNow(rest.join('/'));
      return;
    }
    if (first !== '' && first !== '$all' && !own(properties, first)) {
      throw notImplemented(`loading ${this.definition.type}.${first}`);
    }
    const names = first === '' || first === '$all' ? Object.keys(properties) : [first];
    for (const name of names) this.loaded.set(name, properties[name]?.get(target));
  }

  private setAll(values: unknown): void {
    if (typeof values !== 'object' || values === null) return;
    for (const [name, value] of Object.entries(values)) {
      const linked = own(this.definition.links, name) ? remoteBehind(this.read(name)) : null;
      if (linked) linked.setAll(value);
      else this.write(name, value);
    }
  }

  private toJSON(): Record<string, unknown> {
    const shown: Record<string, unknown> = Object.fromEntries(this.loaded);
    if (this.loadedItems) shown['items'] = this.loadedItems;
    return shown;
  }

  private eventSource(name: string): object {
    const subscribe = own(this.definition.events, name);
    return {
      add: (handler: (event: object) => unknown) => {
        let end: (() => void) | null = null;
        this.act(`${name}.add`, (target) => {
          if (!subscribe) return;
          const send = (event: object) => this.context.book.later(() => handler(event));
          end = this.context.book.untilPageCloses(subscribe(this, target, send));
        });
        return {
          context: contextProxy(this.context),
          handler,
          remove: () => this.act(`${name}.remove`, () => end?.()),
        };
      },
      remove: () => {
        throw notImplemented(`${this.definition.type}.${name}.remove (remove through the result of add)`);
      },
    };
  }
}

/** A member of a collection, already found. */
export function member<T>(context: RequestContext, definition: Definition<T>, target: T): Remote<never> {
  // Held in a list beside members of other types; each keeps to its own definition.
  return new Remote<T>(context, definition, () => target) as unknown as Remote<never>;
}

function own<V>(table: Readonly<Record<string, V>> | undefined, name: string): V | undefined {
  return table && Object.hasOwn(table, name) ? table[name] : undefined;
}

/** The paths that an argument of `load` names: text, list of texts, or nested object of booleans. */
function pathsOf(what: unknown): string[] {
  if (what === undefined || what === null) return [''];
  if (typeof what === 'string') return what.split(',').map((path) => path.trim());
  if (Array.isArray(what)) return what.flatMap((one) => pathsOf(one));
  if (typeof what !== 'object') return [''];
  return Object.entries(what).flatMap(([name, inner]) => {
    if (name === '$top' || name === '$skip' || inner === false) return [];
    if (name === '$all') return [''];
    if (typeof inner !== 'object' || inner === null) return [name];
    return pathsOf(inner).map((path) => `${name}/${path}`);
  });
}

const contexts = new WeakMap<RequestContext, object>();
const contextsBehind = new WeakMap<object, RequestContext>();

/** The context behind the face that the add-in was given, if it is one. */
export function contextBehind(value: unknown): RequestContext | null {
  return typeof value === 'object' && value !== null ? (contextsBehind.get(value) ?? null) : null;
}

/** A context's public face; `open` gives the objects that hang from it. */
export function contextProxy(context: RequestContext, open?: () => Readonly<Record<string, object>>): object {
  const known = contexts.get(context);
  if (known) return known;
  const objects = open?.() ?? {};
  const proxy = new Proxy(context, {
    get(target, name) {
      if (typeof name === 'symbol' || name === 'then' || name === 'constructor') return undefined;
      const object = objects[name];
      if (object) return object;
      if (name === 'sync') return (passThrough?: unknown) => target.sync(passThrough);
      if (name === 'load') return (object: unknown, what?: unknown) => void remoteBehind(object)?.load(what);
      if (name === 'trackedObjects') return { add: () => undefined, remove: () => undefined };
      if (name === 'debugInfo') return {};
      throw notImplemented(`RequestContext.${name}`);
    },
  });
  contexts.set(context, proxy);
  contextsBehind.set(proxy, context);
  return proxy;
}

function strictProxy<T>(remote: Remote<T>): object {
  return new Proxy(
    {},
    {
      get(_, name) {
        if (typeof name === 'symbol' || name === 'then' || name === 'constructor') return undefined;
        return remote.read(name);
      },
      set(_, name, value) {
        if (typeof name === 'symbol') return false;
        remote.write(name, value);
        return true;
      },
    },
  );
}
