import { CalendarDays } from 'lucide-react';
import { Link } from 'react-router-dom';
import { classLabel } from '../../../../server/contract/document-classes.ts';
import { calendarEndpoints, type Reminder } from '../../../../server/contract/reminders.ts';
import { Badge, type BadgeTone } from '../../../components/ui/badge.tsx';
import { FileLink } from '../../../components/ui/button.tsx';
import { buildApiUrl } from '../../../lib/api-client.ts';
import { formatDay, formatInstant } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';

const stateWords: Record<Reminder['state'], string> = {
  coming: 'coming',
  queued: 'on its way',
  sent: 'sent',
  failing: 'not sent yet',
};
const stateTones: Record<Reminder['state'], BadgeTone> = {
  coming: 'soon',
  queued: 'neutral',
  sent: 'good',
  failing: 'danger',
};

/** Dates that are coming, or messages that went out. */
export function ReminderList({
  householdId,
  reminders,
}: {
  householdId: string;
  reminders: Reminder[];
}) {
  return (
    <ul className="divide-y divide-line rounded-lg border border-line bg-paper-raised">
      {reminders.map((reminder) => (
        <li key={reminder.key} className="flex flex-wrap items-center gap-x-5 gap-y-1 px-4 py-3">
          <span className="w-40 text-ink-soft tabular-nums">{formatDay(reminder.on)}</span>
          <div className="min-w-0 flex-1 basis-64">
            <p>
              {reminder.paperId ? (
                <Link
                  className="font-semibold underline"
                  to={paths.review(householdId, reminder.paperId)}
                >
                  {reminder.class ? classLabel(reminder.class) : 'A paper'} (no.{' '}
                  {reminder.paperNumber})
                </Link>
              ) : (
                <span className="font-semibold">A paper that has left</span>
              )}{' '}
              {reminder.kind === 'expiry'
                ? `runs out on ${formatDay(reminder.about)}`
                : `was to be kept until ${formatDay(reminder.about)}`}
            </p>
            {reminder.personName ? (
              <p className="text-sm text-ink-soft">
                to {reminder.personName}
                {reminder.sentAt ? `, ${formatInstant(reminder.sentAt)}` : ''}
                {reminder.lastError ? `. ${reminder.lastError}` : ''}
              </p>
            ) : null}
          </div>
          {reminder.paperId && reminder.state === 'coming' ? (
            <FileLink
              href={buildApiUrl(calendarEndpoints.getPaperCalendar, {
                params: { id: reminder.paperId },
              })}
              icon={<CalendarDays aria-hidden />}
              aria-label={`Dates of paper ${reminder.paperNumber} for a calendar`}
            >
              .ics
            </FileLink>
          ) : null}
          <Badge tone={stateTones[reminder.state]}>{stateWords[reminder.state]}</Badge>
        </li>
      ))}
    </ul>
  );
}
