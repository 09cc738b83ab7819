import { FileText } from 'lucide-react';
import type { ShredList } from '../../../../server/contract/shred-lists.ts';
import { FileLink } from '../../../components/ui/button.tsx';
import { formatDay } from '../../../lib/format.ts';
import { recordPdfUrl, shredListPdfUrl } from '../api/get-shred-list.ts';
import { AgreedFacts, ShreddedFacts } from './list-facts.tsx';

/** Beside the papers: what is known of the list, what to take care of, and what can be printed. */
export function ListSide({ list }: { list: ShredList }) {
  return (
    <aside aria-label="About this list" className="space-y-7 lg:sticky lg:top-6 lg:self-start">
      <div className="flex flex-wrap gap-3">
        {list.destruction ? (
          <FileLink
            href={recordPdfUrl(list.id)}
            target="_blank"
            rel="noreferrer"
            icon={<FileText aria-hidden />}
          >
            Print what was shredded
          </FileLink>
        ) : null}
        {list.rows.length > 0 ? (
          <FileLink
            href={shredListPdfUrl(list.id)}
            target="_blank"
            rel="noreferrer"
            icon={<FileText aria-hidden />}
          >
            Print the list
          </FileLink>
        ) : null}
      </div>
      {list.destruction ? <ShreddedFacts destruction={list.destruction} /> : null}
      {list.approval ? <AgreedFacts approval={list.approval} /> : null}
      <section>
        <h2 className="text-lg font-semibold">Take care</h2>
        <ul className="mt-2 space-y-2 text-sm text-ink-soft">
          {list.cautions.map((caution) => (
            <li key={caution} className="border-l-2 border-line-strong pl-3">
              {caution}
            </li>
          ))}
        </ul>
      </section>
      <p className="text-sm text-ink-soft">
        Asked about for {formatDay(list.on)}.
        {list.securityLevel
          ? ` The finest shredder level any paper asks for is ${list.securityLevel}.`
          : ''}
      </p>
    </aside>
  );
}
