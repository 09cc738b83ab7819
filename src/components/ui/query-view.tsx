import type { ReactNode } from 'react';
import type { UseQueryResult } from '@tanstack/react-query';
import { sentenceOf } from '../../lib/api-error.ts';
import { Banner } from './banner.tsx';
import { Button } from './button.tsx';
import { ErrorState, SkeletonLines } from './states.tsx';

interface QueryViewProps<T> {
  query: UseQueryResult<T>;
  /** What is being loaded, for the error: "the boxes". */
  what: string;
  loading?: ReactNode;
  children: (data: T) => ReactNode;
}

/** Loading, failed and ready of one query; what was seen before stays in view when a refresh fails. */
export function QueryView<T>({ query, what, loading, children }: QueryViewProps<T>) {
  const { data, error } = query;
  const retry = (): void => {
    void query.refetch();
  };
  if (data === undefined) {
    if (error) return <ErrorState error={error} what={what} onRetry={retry} />;
    return loading ?? <SkeletonLines label={`Loading ${what}`} />;
  }
  return (
    <>
      {error ? (
        <Banner
          tone="info"
          className="mb-4"
          title="This may be out of date"
          action={
            <Button size="small" onClick={retry}>
              Try again
            </Button>
          }
        >
          {sentenceOf(error)}
        </Banner>
      ) : null}
      {children(data)}
    </>
  );
}
