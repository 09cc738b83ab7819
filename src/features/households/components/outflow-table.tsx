import type { ReactNode } from 'react';
import type { Outflow } from '../../../../server/contract/households.ts';
import { formatNumber } from '../../../lib/format.ts';

function Line({ name, sheets, papers }: { name: ReactNode; sheets: number; papers?: number }) {
  return (
    <tr className="border-b border-line last:border-b-0">
      <th scope="row" className="py-1.5 pr-6 font-normal">
        {name}
      </th>
      <td className="py-1.5 pr-6 text-right">{formatNumber(sheets)}</td>
      <td className="py-1.5 text-right">{papers === undefined ? '' : formatNumber(papers)}</td>
    </tr>
  );
}

/** The outflow in figures, for whoever would rather read or hear it. */
export function OutflowTable({ outflow }: { outflow: Outflow }) {
  return (
    <details className="mt-3">
      <summary className="inline-flex min-h-11 items-center font-semibold text-teal-strong">
        Year by year, in figures
      </summary>
      <table className="mt-2 text-left">
        <caption className="sr-only">Sheets and papers that may leave, by year</caption>
        <thead className="border-b border-line-strong text-sm text-ink-soft">
          <tr>
            <th scope="col" className="py-1.5 pr-6">
              When
            </th>
            <th scope="col" className="py-1.5 pr-6 text-right">
              Sheets
            </th>
            <th scope="col" className="py-1.5 text-right">
              Papers
            </th>
          </tr>
        </thead>
        <tbody>
          {outflow.dueNow > 0 ? <Line name="May leave now" sheets={outflow.dueNow} /> : null}
          {outflow.years
            .filter((y) => y.sheets > 0)
            .map((y) => (
              <Line key={y.year} name={y.year} sheets={y.sheets} papers={y.papers} />
            ))}
          {outflow.open > 0 ? <Line name="Not settled yet" sheets={outflow.open} /> : null}
          {outflow.toReview > 0 ? (
            <Line name="Not looked at yet" sheets={outflow.toReview} />
          ) : null}
          {outflow.permanent > 0 ? <Line name="Stays for good" sheets={outflow.permanent} /> : null}
        </tbody>
      </table>
    </details>
  );
}
