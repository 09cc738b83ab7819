import { queryOptions, useQuery } from '@tanstack/react-query';
import { reminderEndpoints } from '../../../../server/contract/reminders.ts';
import { callApi } from '../../../lib/api-client.ts';

export function remindersQuery(householdId: string) {
  return queryOptions({
    queryKey: ['households', householdId, 'reminders'],
    queryFn: ({ signal }) =>
      callApi(reminderEndpoints.listReminders, { params: { id: householdId }, signal }),
  });
}

export function useReminders(householdId: string) {
  return useQuery(remindersQuery(householdId));
}
