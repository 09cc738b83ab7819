import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import { reminderEndpoints } from '../../../../server/contract/reminders.ts';
import { callApi } from '../../../lib/api-client.ts';

export const mailPageSize = 50;

export function mailQuery(page: number) {
  return queryOptions({
    queryKey: ['mail', page],
    queryFn: ({ signal }) =>
      callApi(reminderEndpoints.listMail, { query: { page, pageSize: mailPageSize }, signal }),
    placeholderData: keepPreviousData,
  });
}

export const useMail = (page: number) => useQuery(mailQuery(page));
