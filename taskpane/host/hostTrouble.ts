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
  if (error instanceof HostTrouble || !(error instanceof Error) || !('code' in error)) return error;
  const kind = kinds.get(String(error.code)) ?? 'other';
  return new HostTrouble(kind, hostWords.trouble(kind, error.message));
}
