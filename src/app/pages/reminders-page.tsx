import { BellRing } from 'lucide-react';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { Section } from '../../components/ui/section.tsx';
import { EmptyState } from '../../components/ui/states.tsx';
import { useHousehold } from '../../features/households/api/get-household.ts';
import { useReminders } from '../../features/reminders/api/list-reminders.ts';
import { CalendarAddress } from '../../features/reminders/components/calendar-address.tsx';
import { LeadDaysForm } from '../../features/reminders/components/lead-days-form.tsx';
import { ReminderList } from '../../features/reminders/components/reminder-list.tsx';
import { useMay } from '../../lib/use-may.ts';
import { useRouteId } from '../use-route-id.ts';

/** What will be reminded of, what was, and how long before. */
export function Component() {
  const householdId = useRouteId('householdId');
  const reminders = useReminders(householdId);
  const household = useHousehold(householdId);
  const mayUpdate = useMay('household:update', householdId);
  const mayHaveCalendar = useMay('calendar:read', householdId);
  return (
    <PageFrame>
      <PageHeading title="Reminders">
        Messages go out in the morning, each once, to those who look after the household.
      </PageHeading>
      <QueryView query={reminders} what="the reminders">
        {({ items }) => {
          const coming = items.filter((item) => item.state === 'coming');
          const past = items.filter((item) => item.state !== 'coming');
          return (
            <>
              <Section title="Coming within two years">
                {coming.length > 0 ? (
                  <ReminderList householdId={householdId} reminders={coming} />
                ) : (
                  <EmptyState icon={<BellRing />} title="No date is coming">
                    Dates appear here when papers are looked through.
                  </EmptyState>
                )}
              </Section>
              {past.length > 0 ? (
                <Section title="Said already">
                  <ReminderList householdId={householdId} reminders={past} />
                </Section>
              ) : null}
            </>
          );
        }}
      </QueryView>
      {mayUpdate && household.data ? (
        <Section title="How long before" intro="Days of notice before something runs out.">
          <LeadDaysForm key={household.data.version} household={household.data} />
        </Section>
      ) : null}
      {mayHaveCalendar ? (
        <Section
          title="In your calendar"
          intro="The same dates in a calendar program. Titles give nothing away."
        >
          <CalendarAddress householdId={householdId} />
        </Section>
      ) : null}
    </PageFrame>
  );
}
