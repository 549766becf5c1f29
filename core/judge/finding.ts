/** One sentence about a fit, and how serious it is. */
export interface Finding {
  readonly level: 'stop' | 'caution' | 'note';
  readonly text: string;
}

export function stop(text: string): Finding {
  return { level: 'stop', text };
}

export function caution(text: string): Finding {
  return { level: 'caution', text };
}

export function note(text: string): Finding {
  return { level: 'note', text };
}
