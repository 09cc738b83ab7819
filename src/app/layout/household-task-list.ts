import { BellRing, Eye, Layers, PackageOpen, Search, Wind } from 'lucide-react';
import type { LucideIcon } from 'lucide-react';
import type { Household } from '../../../server/contract/households.ts';
import type { Permission } from '../../../server/contract/permissions.ts';
import { paths } from '../../lib/paths.ts';

export interface HouseholdTask {
  label: string;
  /** For the bar at the bottom of a phone. */
  shortLabel: string;
  icon: LucideIcon;
  to: (householdId: string) => string;
  permission: Permission;
  /** How much of it waits; 0 shows nothing. */
  countWaiting?: (counts: Household['counts']) => number;
  /** What the number counts, for those who listen. */
  waitingWords?: string;
  /** Where screens of this task have an address of their own. */
  alsoAt?: string;
  /** Lit up only at exactly this address. */
  exact?: boolean;
}

/** The tasks of the job, in the order in which they are done. */
export const householdTasks: readonly HouseholdTask[] = [
  {
    label: 'Overview',
    shortLabel: 'Overview',
    icon: Layers,
    to: paths.household,
    permission: 'household:read',
    exact: true,
  },
  {
    label: 'Bring in',
    shortLabel: 'Bring in',
    icon: PackageOpen,
    to: paths.boxes,
    alsoAt: '/boxes/',
    permission: 'box:read',
    countWaiting: (counts) => counts.reading,
    waitingWords: 'being read',
  },
  {
    label: 'Look through',
    shortLabel: 'Look',
    icon: Eye,
    to: paths.review,
    permission: 'paper:review',
    countWaiting: (counts) => counts.toReview,
    waitingWords: 'to look at',
  },
  {
    label: 'Find',
    shortLabel: 'Find',
    icon: Search,
    to: paths.papers,
    permission: 'paper:read',
  },
  {
    label: 'Let go',
    shortLabel: 'Let go',
    icon: Wind,
    to: paths.shredLists,
    alsoAt: '/shred-lists/',
    permission: 'shred-list:read',
    countWaiting: (counts) => counts.leaving,
    waitingWords: 'leaving',
  },
  {
    label: 'Remember',
    shortLabel: 'Remember',
    icon: BellRing,
    to: paths.reminders,
    permission: 'reminder:read',
  },
];

/** What is looked up now and then, not part of the row of tasks. */
export const householdBackground: readonly Pick<HouseholdTask, 'label' | 'to' | 'permission'>[] = [
  { label: 'About the household', to: paths.about, permission: 'household:read' },
  { label: 'What papers are about', to: paths.subjects, permission: 'subject:read' },
  { label: 'Don’t destroy yet', to: paths.holds, permission: 'hold:read' },
  { label: 'What happened', to: paths.activity, permission: 'activity:read' },
];
