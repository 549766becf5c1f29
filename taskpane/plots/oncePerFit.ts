import type { Fit } from '../../core/fit/fit.ts';

/** Work on a fit that is done when it is first asked for, and not again as long as the fit is around. */
export function oncePerFit<T>(work: (fit: Fit) => T): (fit: Fit) => T {
  const done = new WeakMap<Fit, { readonly result: T }>();
  return (fit) => {
    const found = done.get(fit) ?? { result: work(fit) };
    done.set(fit, found);
    return found.result;
  };
}
