import { queryOptions, useQuery } from '@tanstack/react-query';
import { ruleTableEndpoints } from '../../../../server/contract/rule-tables.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Shipped tables change with the application only. */
const staleTime = 60 * 60 * 1000;

export const ruleTablesQuery = queryOptions({
  queryKey: ['rule-tables'],
  queryFn: ({ signal }) => callApi(ruleTableEndpoints.listRuleTables, { signal }),
  staleTime,
});

export function ruleTableQuery(country: string) {
  return queryOptions({
    queryKey: ['rule-tables', country],
    queryFn: ({ signal }) =>
      callApi(ruleTableEndpoints.getRuleTable, { params: { country }, signal }),
    staleTime,
  });
}

export const useRuleTables = () => useQuery(ruleTablesQuery);
export const useRuleTable = (country: string) => useQuery(ruleTableQuery(country));
