import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import {
  type createSubjectSchema,
  type Subject,
  subjectEndpoints,
} from '../../../../server/contract/subjects.ts';
import { callApi } from '../../../lib/api-client.ts';

export type SubjectValues = z.input<typeof createSubjectSchema>;

/** Adds a subject, or changes the one given; its papers are worked out anew. */
export function useSaveSubject(householdId: string, subject: Subject | null) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (body: SubjectValues) =>
      subject
        ? callApi(subjectEndpoints.updateSubject, {
            params: { id: subject.id },
            body,
            ifMatch: subject.version,
          })
        : callApi(subjectEndpoints.createSubject, { params: { id: householdId }, body }),
    onSuccess: () => queryClient.invalidateQueries({ queryKey: ['households', householdId] }),
  });
}
