import { useQuery } from '@tanstack/react-query';
import { subjectEndpoints } from '../../../../server/contract/subjects.ts';
import { callApi } from '../../../lib/api-client.ts';

/** What papers of the household are about, to link this one. */
export function useSubjectChoices(householdId: string, isAllowed: boolean) {
  return useQuery({
    queryKey: ['households', householdId, 'subjects'],
    queryFn: ({ signal }) =>
      callApi(subjectEndpoints.listSubjects, { params: { id: householdId }, signal }),
    enabled: isAllowed,
  });
}
