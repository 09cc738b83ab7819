import { classLabel } from '../../../../server/contract/document-classes.ts';
import type { ReadingQuality } from '../../../../server/contract/reading-quality.ts';
import { Cell, HeadCell, Row, Table } from '../../../components/ui/table.tsx';
import { formatMonth, formatNumber } from '../../../lib/format.ts';

type Counts = Pick<ReadingQuality, 'papers' | 'kindCorrected' | 'dateCorrected'>;

/** "24 of 30 (80 %)": how many needed no correction; on a phone without the share. */
function RightCell({ papers, corrected }: { papers: number; corrected: number }) {
  const right = papers - corrected;
  const share = papers === 0 ? 0 : Math.round((100 * right) / papers);
  return (
    <Cell className="text-right whitespace-nowrap tabular-nums">
      {formatNumber(right)} of {formatNumber(papers)}
      <span className="hidden text-ink-soft sm:inline"> ({share} %)</span>
    </Cell>
  );
}

function CountCells({ counts }: { counts: Counts }) {
  return (
    <>
      <RightCell papers={counts.papers} corrected={counts.kindCorrected} />
      <RightCell papers={counts.papers} corrected={counts.dateCorrected} />
    </>
  );
}

export function MonthTable({ quality }: { quality: ReadingQuality }) {
  return (
    <Table caption="Read right, by month" showCaption>
      <thead>
        <tr>
          <HeadCell>Month</HeadCell>
          <HeadCell className="text-right">Kind</HeadCell>
          <HeadCell className="text-right">Date</HeadCell>
        </tr>
      </thead>
      <tbody>
        {quality.months.map((month) => (
          <Row key={month.month}>
            <Cell>{formatMonth(month.month)}</Cell>
            <CountCells counts={month} />
          </Row>
        ))}
        <Row className="font-semibold">
          <Cell>In all</Cell>
          <CountCells counts={quality} />
        </Row>
      </tbody>
    </Table>
  );
}

export function KindTable({ quality }: { quality: ReadingQuality }) {
  return (
    <Table caption="Read right, by kind of paper" showCaption>
      <thead>
        <tr>
          <HeadCell>What it is</HeadCell>
          <HeadCell className="text-right">Kind</HeadCell>
          <HeadCell className="text-right">Date</HeadCell>
          <HeadCell>Was taken for</HeadCell>
        </tr>
      </thead>
      <tbody>
        {quality.classes.map((row) => (
          <Row key={row.class}>
            <Cell>{classLabel(row.class)}</Cell>
            <CountCells counts={row} />
            <Cell className="text-ink-soft">
              {row.takenFor
                .map((mistake) => `${classLabel(mistake.class)} (${formatNumber(mistake.papers)})`)
                .join(', ')}
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
