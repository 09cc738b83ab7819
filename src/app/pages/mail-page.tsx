import { Mail } from 'lucide-react';
import { useSearchParams } from 'react-router-dom';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { Badge } from '../../components/ui/badge.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { EmptyState } from '../../components/ui/states.tsx';
import { Pager } from '../../components/ui/table.tsx';
import { mailPageSize, useMail } from '../../features/mail/api/list-mail.ts';
import { formatCount, formatInstant } from '../../lib/format.ts';

/** Messages of the practice: what went out, what waits, what does not go through. */
export function Component() {
  const [search, setSearch] = useSearchParams();
  const page = Math.max(1, Number(search.get('page') ?? '1') || 1);
  const mail = useMail(page);
  return (
    <PageFrame>
      <PageHeading title="Messages sent">
        What cannot be sent is tried again by itself, more and more seldom.
      </PageHeading>
      <QueryView query={mail} what="the messages">
        {({ items, total }) =>
          items.length === 0 ? (
            <EmptyState icon={<Mail />} title="No message yet" />
          ) : (
            <>
              <ul className="divide-y divide-line rounded-lg border border-line bg-paper-raised">
                {items.map((message) => (
                  <li
                    key={message.id}
                    className="flex flex-wrap items-center gap-x-5 gap-y-1 px-4 py-3"
                  >
                    <span className="w-44 text-sm text-ink-soft tabular-nums">
                      {formatInstant(message.createdAt)}
                    </span>
                    <span className="min-w-0 flex-1 basis-64">
                      {message.subject}
                      <span className="text-ink-soft"> · to {message.toName}</span>
                    </span>
                    {message.state === 'sent' ? (
                      <Badge tone="good">sent</Badge>
                    ) : message.state === 'queued' ? (
                      <Badge>on its way</Badge>
                    ) : (
                      <Badge tone="soon">not sent yet</Badge>
                    )}
                    {message.lastError ? (
                      <p className="basis-full text-sm text-ink-soft">
                        {message.lastError} Tried {formatCount(message.attempts, 'time')}
                        {message.nextAttemptAt
                          ? `; next on ${formatInstant(message.nextAttemptAt)}`
                          : ''}
                        .
                      </p>
                    ) : null}
                  </li>
                ))}
              </ul>
              <Pager
                page={page}
                pageSize={mailPageSize}
                total={total}
                onPage={(next) => setSearch({ page: String(next) })}
              />
            </>
          )
        }
      </QueryView>
    </PageFrame>
  );
}
