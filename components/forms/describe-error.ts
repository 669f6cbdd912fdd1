import { i18n } from '@/hooks/i18n/i18n';
import { ApiError, OfflineError } from '@/hooks/api/client';

/** What went wrong with the server and what to do, in a sentence of the catalogue. Anything else is a fault of ours and is thrown on. */
export function describeError(error: unknown): string {
  if (error instanceof OfflineError) return i18n.t('errors:no-signal');
  if (error instanceof ApiError) return i18n.t(`errors:${error.code}`);
  throw error;
}
