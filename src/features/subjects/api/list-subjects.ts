import { queryOptions, useQuery } from '@tanstack/react-query';
import { subjectEndpoints } from '../../../../server/contract/subjects.ts';
import { callApi } from '../../../lib/api-client.ts';

export function subjectsQuery(householdId: string) {
  return queryOptions({
    queryKey: ['households', householdId, 'subjects'],
    queryFn: ({ signal }) =>
      callApi(subjectEndpoints.listSubjects, { params: { id: householdId }, signal }),
  });
}

export function useSubjects(householdId: string) {
  return useQuery(subjectsQuery(householdId));
}
