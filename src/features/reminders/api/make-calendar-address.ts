import { useMutation } from '@tanstack/react-query';
import { calendarEndpoints } from '../../../../server/contract/reminders.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Makes a new secret address of the calendar feed; an earlier one stops working. */
export function useMakeCalendarAddress(householdId: string) {
  return useMutation({
    mutationFn: () =>
      callApi(calendarEndpoints.getCalendarAddress, { params: { id: householdId } }),
  });
}
