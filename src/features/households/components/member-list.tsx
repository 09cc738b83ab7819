import type { z } from 'zod';
import type { memberSchema } from '../../../../server/contract/households.ts';
import { QueryView } from '../../../components/ui/query-view.tsx';
import { Section } from '../../../components/ui/section.tsx';
import { formatDay } from '../../../lib/format.ts';
import { useMembers } from '../api/list-members.ts';

type Membership = z.infer<typeof memberSchema>['membership'];

const roleWords: Record<Membership['role'], string> = {
  owner: 'runs the practice',
  assistant: 'works for the practice',
  client: 'of the household',
  adviser: 'adviser: sees only what is shared',
};
const standingWords: Record<NonNullable<Membership['standing']>, string> = {
  self: 'for themselves',
  'joint-owner': 'joint owner',
  attorney: 'attorney',
  deputy: 'deputy',
  executor: 'executor',
  helper: 'helper',
};

/** Who can see this household. */
export function MemberList({ householdId }: { householdId: string }) {
  const members = useMembers(householdId);
  return (
    <Section title="Who can see this household">
      <QueryView query={members} what="the members">
        {({ items }) => (
          <ul>
            {items.map(({ membership, user }) => (
              <li key={membership.id} className="border-t border-line py-2.5">
                <span className="font-semibold">{user.name}</span>{' '}
                <span className="text-ink-soft">
                  {roleWords[membership.role]}
                  {membership.standing ? ` (${standingWords[membership.standing]})` : ''} · since{' '}
                  {formatDay(membership.startsOn)}
                  {membership.endsOn ? ` until ${formatDay(membership.endsOn)}` : ''}
                </span>
              </li>
            ))}
          </ul>
        )}
      </QueryView>
    </Section>
  );
}
