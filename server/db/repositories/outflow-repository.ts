import type { Visibility } from './register-repository.ts';
import { selectRows } from './sql.ts';

export interface OutflowRow {
  part: 'left' | 'to-review' | 'permanent' | 'open' | 'due' | 'year';
  year: number | null;
  sheets: number;
  papers: number;
}

/** Sheets and papers of a household by what becomes of them; each paper counts once. */
export function sumOutflow(
  householdId: string,
  visible: Visibility,
  today: string,
): Promise<OutflowRow[]> {
  return selectRows<OutflowRow>(
    `with parts as (
       select sheets,
         case when status = 'left' then 'left'
              when status = 'to-review' then 'to-review'
              when permanent then 'permanent'
              when open or held or shred_from is null then 'open'
              when goes_from <= $today::date then 'due'
              else 'year' end as part,
         goes_from
       from (
         select *, case when advised_until is not null and stepped_down is null
             then greatest(shred_from, advised_until + 1) else shred_from end as goes_from
         from papers
         where household_id = $householdId
           and ($groups::text[] is null or class_group = any($groups::text[]))
           and (eyes_only_user_id is null or eyes_only_user_id = $userId)) p)
     select part, case when part = 'year' then extract(year from goes_from)::int end as year,
       sum(sheets)::int as sheets, count(*)::int as papers
     from parts group by 1, 2`,
    { householdId, groups: visible.groups, userId: visible.userId, today },
  );
}
