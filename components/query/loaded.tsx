import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { describeError } from '@/components/forms/describe-error';
import { ErrorState } from '@/components/ui/error-state';
import { LoadingState } from '@/components/ui/loading-state';
import { Notice } from '@/components/ui/notice';
import { OfflineError } from '@/hooks/api/client';

interface LoadedProps<Data> {
  query: UseQueryResult<Data>;
  /** What is on its way: "The job". */
  loading?: string;
  children: (data: Data) => ReactNode;
}

/**
 * What a query fetched, or where it is: on its way, or refused with a way to try again. What was fetched before stays on the
 * screen through a dead spot, and is said to be old.
 */
export function Loaded<Data>({ query, loading, children }: LoadedProps<Data>) {
  const { t } = useTranslation('common');
  const { data, error, isFetching, refetch } = query;
  if (data === undefined) {
    if (error === null || isFetching) return <LoadingState label={loading} />;
    return (
      <ErrorState title={t('state.failed')} onRetry={() => void refetch()}>
        {describeError(error)}
      </ErrorState>
    );
  }
  return (
    <>
      {error === null ? null : (
        <Notice kind="caution" announce>
          {error instanceof OfflineError ? t('state.offline') : describeError(error)}
        </Notice>
      )}
      {children(data)}
    </>
  );
}
