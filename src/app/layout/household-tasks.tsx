import { ChevronDown, Ellipsis } from 'lucide-react';
import { useQuery } from '@tanstack/react-query';
import { Link, NavLink, useLocation, useMatch } from 'react-router-dom';
import type { Household } from '../../../server/contract/households.ts';
import type { Permission } from '../../../server/contract/permissions.ts';
import { Menu, MenuItem } from '../../components/ui/menu.tsx';
import { householdQuery } from '../../features/households/api/get-household.ts';
import { joinClasses } from '../../lib/join-classes.ts';
import { useSession } from '../../lib/session.ts';
import { decideMay } from '../../lib/use-may.ts';
import { householdBackground, householdTasks } from './household-task-list.ts';
import type { HouseholdTask } from './household-task-list.ts';

interface HouseholdTasksProps {
  householdId: string | null;
}

/** Which of the tasks this person has, and how much waits in each. */
function useTasks(householdId: string | null) {
  const session = useSession();
  const { pathname } = useLocation();
  const { data: household } = useQuery({
    ...householdQuery(householdId ?? ''),
    enabled: householdId !== null,
  });
  const may = (permission: Permission): boolean =>
    decideMay(session?.memberships ?? [], permission, householdId);
  return {
    isAt: (task: HouseholdTask) => task.alsoAt !== undefined && pathname.startsWith(task.alsoAt),
    tasks: householdTasks.filter((task) => may(task.permission)),
    background: householdBackground.filter((place) => may(place.permission)),
    counts: household?.counts,
  };
}

function WaitingCount({ task, counts }: { task: HouseholdTask; counts?: Household['counts'] }) {
  const waiting = counts && task.countWaiting ? task.countWaiting(counts) : 0;
  if (waiting === 0) return null;
  return (
    <span className="rounded-full bg-teal-wash px-2 text-sm font-semibold text-teal-strong">
      {waiting}
      <span className="sr-only"> {task.waitingWords}</span>
    </span>
  );
}

/** The tasks in a row under the header, on screens with room for it. */
export function HouseholdTaskRow({ householdId }: HouseholdTasksProps) {
  const { tasks, background, counts, isAt } = useTasks(householdId);
  const inBackground = useMatch('/households/:householdId/:place');
  const current = background.find(
    (place) => householdId && inBackground?.pathname === place.to(householdId),
  );
  if (!householdId) {
    return (
      <div data-screen-only className="hidden h-12 border-b border-line bg-paper-raised md:block" />
    );
  }
  return (
    <nav
      data-screen-only
      aria-label="Tasks"
      className="hidden h-12 border-b border-line bg-paper-raised md:block"
    >
      <ol className="flex h-full items-stretch gap-1 px-3 lg:px-5">
        {tasks.map((task) => (
          <li key={task.label} className="flex">
            <NavLink
              to={task.to(householdId)}
              end={task.exact ?? false}
              className={({ isActive }) =>
                joinClasses(
                  'flex items-center gap-2 border-b-3 px-2.5 pt-0.5 font-semibold whitespace-nowrap no-underline lg:px-3.5',
                  isActive || isAt(task)
                    ? 'border-teal text-ink'
                    : 'border-transparent text-ink-soft hover:border-line hover:text-ink',
                )
              }
            >
              {task.label}
              <WaitingCount task={task} {...(counts ? { counts } : {})} />
            </NavLink>
          </li>
        ))}
        {background.length > 0 ? (
          <li className="ml-auto flex items-center">
            <Menu
              trigger={
                <button
                  type="button"
                  className={joinClasses(
                    'flex h-full items-center gap-1.5 border-b-3 px-2.5 pt-0.5 font-semibold whitespace-nowrap',
                    current
                      ? 'border-teal text-ink'
                      : 'border-transparent text-ink-soft hover:text-ink',
                  )}
                >
                  {current?.label ?? 'Background'}
                  <ChevronDown aria-hidden className="size-4" />
                </button>
              }
            >
              {background.map((place) => (
                <MenuItem key={place.label} asChild>
                  <Link to={place.to(householdId)}>{place.label}</Link>
                </MenuItem>
              ))}
            </Menu>
          </li>
        ) : null}
      </ol>
    </nav>
  );
}

const mostByThumb = 5;

/** The tasks by the thumb, at the bottom of a phone. */
export function HouseholdBottomBar({ householdId }: HouseholdTasksProps) {
  const { tasks, background, counts, isAt } = useTasks(householdId);
  const byThumb = tasks.slice(0, mostByThumb);
  const rest = [...tasks.slice(mostByThumb), ...background];
  const cell =
    'relative flex h-16 min-w-0 flex-1 flex-col items-center justify-center gap-1 border-t-3 text-xs font-semibold no-underline';
  return (
    <nav
      data-screen-only
      aria-label="Tasks"
      className="fixed inset-x-0 bottom-0 z-20 flex min-h-16 border-t border-line bg-paper-raised pb-[env(safe-area-inset-bottom)] md:hidden"
    >
      {householdId
        ? byThumb.map((task) => (
            <NavLink
              key={task.label}
              to={task.to(householdId)}
              end={task.exact ?? false}
              className={({ isActive }) =>
                joinClasses(
                  cell,
                  isActive || isAt(task)
                    ? 'border-teal text-teal-strong'
                    : 'border-transparent text-ink-soft',
                )
              }
            >
              <task.icon aria-hidden className="size-5.5" />
              <span>{task.shortLabel}</span>
              <span className="absolute top-0.5 left-1/2 ml-1 scale-85">
                <WaitingCount task={task} {...(counts ? { counts } : {})} />
              </span>
            </NavLink>
          ))
        : null}
      {householdId && rest.length > 0 ? (
        <Menu
          side="top"
          trigger={
            <button type="button" className={joinClasses(cell, 'border-transparent text-ink-soft')}>
              <Ellipsis aria-hidden className="size-5.5" />
              <span>More</span>
            </button>
          }
        >
          {rest.map((place) => (
            <MenuItem key={place.label} asChild>
              <Link to={place.to(householdId)}>{place.label}</Link>
            </MenuItem>
          ))}
        </Menu>
      ) : null}
    </nav>
  );
}
