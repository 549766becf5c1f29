import { createContext } from 'preact';
import { useContext, useLayoutEffect, useState } from 'preact/hooks';
import type { Choice } from '../state/choice.ts';
import type { PanelState } from '../state/panelState.ts';
import type { Session } from '../state/session.ts';

export const SessionContext = createContext<Session | null>(null);

export function useSession(): Session {
  const session = useContext(SessionContext);
  if (session === null) throw new Error('a view stands outside the panel');
  return session;
}

/** A part of the panel's state; the view is drawn again when that part changes. */
export function usePart<T>(part: (state: PanelState) => T): T {
  const { store } = useSession();
  const [, redraw] = useState(0);
  const now = part(store.get());
  useLayoutEffect(() => {
    let last = now;
    const check = (): void => {
      const next = part(store.get());
      if (Object.is(next, last)) return;
      last = next;
      redraw((count) => count + 1);
    };
    check();
    return store.follow(check);
  });
  return now;
}

export function useChoice(): Choice {
  return usePart((state) => state.history.present);
}
