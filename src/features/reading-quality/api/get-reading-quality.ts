import { queryOptions, useQuery } from '@tanstack/react-query';
import { readingQualityEndpoints } from '../../../../server/contract/reading-quality.ts';
import { callApi } from '../../../lib/api-client.ts';

export const readingQualityQuery = queryOptions({
  queryKey: ['reading-quality'],
  queryFn: ({ signal }) => callApi(readingQualityEndpoints.getReadingQuality, { signal }),
});

export const useReadingQuality = () => useQuery(readingQualityQuery);
