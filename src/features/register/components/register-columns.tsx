import { createColumnHelper, tableFeatures, columnVisibilityFeature } from '@tanstack/react-table';
import { classLabel } from '../../../../server/contract/document-classes.ts';
import { type PaperRow, pileLabels } from '../../../../server/contract/papers.ts';
import { Badge } from '../../../components/ui/badge.tsx';
import { formatShortDay } from '../../../lib/format.ts';
import { describeStay, keptWords, statusWords } from '../logic/words.ts';
import { PaperName } from './paper-name.tsx';

/** Sorting and paging are the server's; the table only knows which columns are in view. */
export const features = tableFeatures({ columnVisibilityFeature });
const helper = createColumnHelper<typeof features, PaperRow>();

const day = (value: string | null) => (value ? formatShortDay(value) : '');

/** A column's id is the field it is sorted by. */
export const columns = helper.columns([
  helper.accessor('number', { id: 'number', header: 'No.' }),
  helper.accessor((row) => classLabel(row.class), {
    id: 'class',
    header: 'Paper',
    cell: ({ row }) => <PaperName paper={row.original} />,
  }),
  helper.accessor('issuer', { id: 'issuer', header: 'From' }),
  helper.accessor('addressee', { id: 'addressee', header: 'To' }),
  helper.accessor('reference', { id: 'reference', header: 'Reference' }),
  helper.accessor((row) => day(row.paperOn), { id: 'paperOn', header: 'Date on it' }),
  helper.accessor('taxYear', { id: 'taxYear', header: 'Tax year' }),
  helper.accessor('subjectName', { id: 'subjectName', header: 'What it is about' }),
  helper.accessor((row) => statusWords[row.status], {
    id: 'status',
    header: 'State',
    cell: ({ row }) => (
      <span className="flex flex-wrap gap-1.5">
        <Badge tone={row.original.status === 'to-review' ? 'good' : 'neutral'}>
          {statusWords[row.original.status]}
        </Badge>
        {row.original.held ? <Badge tone="hold">don’t destroy yet</Badge> : null}
      </span>
    ),
  }),
  helper.accessor((row) => (row.pile ? pileLabels[row.pile] : ''), { id: 'pile', header: 'Pile' }),
  helper.accessor((row) => (row.keptBecause ? keptWords[row.keptBecause] : ''), {
    id: 'keptBecause',
    header: 'Kept because of',
  }),
  helper.accessor('place', { id: 'place', header: 'Place' }),
  helper.accessor((row) => describeStay(row), { id: 'keepUntil', header: 'Keep until' }),
  helper.accessor((row) => day(row.expiresOn), { id: 'expiresOn', header: 'Runs out' }),
  helper.accessor('boxCode', { id: 'boxCode', header: 'Box' }),
  helper.accessor('sheets', { id: 'sheets', header: 'Sheets' }),
  helper.accessor('rule', { id: 'rule', header: 'Rule', enableHiding: true }),
  helper.accessor((row) => day(row.leftOn), { id: 'leftOn', header: 'Left on' }),
]);

/** Columns that the server cannot sort by. */
export const unsortable: ReadonlySet<string> = new Set(['rule']);
/** The paper itself stays in view. */
export const fixedColumns: ReadonlySet<string> = new Set(['number', 'class']);
