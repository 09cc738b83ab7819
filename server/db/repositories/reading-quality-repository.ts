import type { ClassId } from '../../contract/document-classes.ts';
import { selectRows } from './sql.ts';

export interface ReadingOutcomeRow {
  /** `yyyy-mm` in the household's time zone. */
  month: string;
  class: ClassId;
  readClass: ClassId;
  papers: number;
  dateCorrected: number;
}

/** Reviewed papers that were read from scans, counted by month, kind and what the reader took them for. */
export function countReadingOutcomes(practiceId: string): Promise<ReadingOutcomeRow[]> {
  return selectRows<ReadingOutcomeRow>(
    `select to_char(p.reviewed_at at time zone h.time_zone, 'YYYY-MM') as month, p.class,
       coalesce(p.read->>'class', 'unrecognised') as "readClass", count(*)::int as papers,
       (count(*) filter (where p.read->'facts'->>'keyDate' is distinct from p.facts->>'keyDate'))::int
         as "dateCorrected"
     from papers p join households h on h.id = p.household_id
     where h.practice_id = $practiceId and p.read is not null and p.reviewed_at is not null
     group by 1, 2, 3`,
    { practiceId },
  );
}
