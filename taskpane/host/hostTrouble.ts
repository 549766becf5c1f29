import { Problem } from '../../core/problem.ts';
import { hostWords } from '../../core/words/panelWords.ts';
import { HostTrouble, type HostTroubleKind } from './workbook.ts';

/** What the host's error codes mean to a user. */
const kinds: ReadonlyMap<string, HostTroubleKind> = new Map<string, HostTroubleKind>([
  ['ItemNotFound', 'gone'],
  ['InvalidReference', 'gone'],
  ['InvalidObjectPath', 'gone'],
  ['InvalidArgument', 'gone'],
  ['AccessDenied', 'protected'],
  ['InvalidOperationInCellEditMode', 'busy'],
  ['InvalidSelection', 'selection'],
  ['RequestPayloadSizeLimitExceeded', 'size'],
  ['ResponsePayloadSizeLimitExceeded', 'size'],
  ['RequestTooLarge', 'size'],
]);

/** The host's error as a `HostTrouble`; what is not the host's is handed back as it is. */
export function asHostTrouble(error: unknown): unknown {
  if (!isHostError(error)) return error;
  const kind = kinds.get(error.code) ?? 'other';
  return new HostTrouble(kind, hostWords.trouble(kind, error.message));
}

/** A host's errors carry a code; they may come from another frame, whose `Error` is not this one's. */
function isHostError(error: unknown): error is { readonly code: string; readonly message: string } {
  if (typeof error !== 'object' || error === null || error instanceof Problem) return false;
  return 'code' in error && typeof error.code === 'string' && 'message' in error;
}
