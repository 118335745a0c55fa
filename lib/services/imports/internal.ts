import type { StoredImport } from '../../../db/queries/imports';
import { type Failure, failure } from '../failure';

/** Why an upload can't be changed any more; null while it waits for its preview to be accepted. */
export function noLongerWaiting(stored: StoredImport): Failure | null {
  switch (stored.status) {
    case 'preview':
      return null;
    case 'accepted':
      return failure(
        'conflict',
        `${stored.fileName} is statement ${stored.statementNumber ?? ''} already.`,
      );
    case 'discarded':
      return failure('conflict', `${stored.fileName} was discarded. Upload it again.`);
  }
}
