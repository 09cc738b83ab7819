import { useMutation } from '@tanstack/react-query';
import { calendarEndpoints } from '../../../../server/contract/reminders.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Ends one's own address: nobody can subscribe with it any more. */
export function useEndCalendarAddress(householdId: string) {
  return useMutation({
    mutationFn: () =>
      callApi(calendarEndpoints.endCalendarAddress, { params: { id: householdId } }),
  });
}

/** Makes a new secret address of the calendar feed; an earlier one stops working. */
export function useMakeCalendarAddress(householdId: string) {
  return useMutation({
    mutationFn: () =>
      callApi(calendarEndpoints.getCalendarAddress, { params: { id: householdId } }),
  });
}
