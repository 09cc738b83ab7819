/**
 * Who may make which call, written down a second time and by call: a change of the permission table or
 * of an endpoint's access that nobody meant shows here.
 */
import type { RightName } from '../../../server/contract/permissions.ts';
import type { World } from './world.ts';

/** For whom a call is; a client by the right it takes. */
export interface Rule {
  owner?: true;
  assistant?: true;
  client?: RightName;
  adviser?: true;
}

export interface Operation {
  /** `public`, everybody signed in, the owner of a practice, or by role in the household. */
  for: 'public' | 'signed-in' | 'practice' | Rule;
  /**
   * The call is about a paper of one kind, about its scan, or enters such a paper: rights that reach other
   * kinds are not enough.
   */
  about?: 'paper' | 'scan' | 'kind';
  params?: (world: World) => Record<string, string>;
  query?: string;
  body?: (world: World) => object;
  version?: (world: World) => number;
  /** Sent in the field "files" instead of a body. */
  file?: Buffer;
}

const practiceStaff: Rule = { owner: true, assistant: true };
const staffAnd = (right: RightName): Rule => ({ ...practiceStaff, client: right });
const readers: Rule = { ...staffAnd('see'), adviser: true };

const ofHousehold = ({ household }: World) => ({ id: household.id });
const ofBox = ({ box }: World) => ({ id: box.id });
const ofPaper = ({ paper }: World) => ({ id: paper.id });
const ofList = ({ list }: World) => ({ id: list.id });
const ofPage = ({ paper }: World) => ({ id: paper.pages[0]?.id ?? '' });
const paperVersion = ({ paper }: World) => paper.version;
const listVersion = ({ list }: World) => list.version;

const household = (rule: Rule, more: Partial<Operation> = {}): Operation => ({
  for: rule,
  params: ofHousehold,
  ...more,
});
const box = (rule: Rule, more: Partial<Operation> = {}): Operation => ({
  for: rule,
  params: ofBox,
  ...more,
});
const paper = (rule: Rule, more: Partial<Operation> = {}): Operation => ({
  for: rule,
  about: 'paper',
  params: ofPaper,
  ...more,
});
const list = (rule: Rule, more: Partial<Operation> = {}): Operation => ({
  for: rule,
  params: ofList,
  ...more,
});

const sameReason = { reason: 'It was asked for' };
const token = () => ({ token: 'no such token' });

export const operations: Record<string, Operation> = {
  // Session and accounts
  getSession: { for: 'public' },
  signIn: { for: 'public', body: () => ({ email: '', password: '' }) },
  signOut: { for: 'public' },
  requestPasswordReset: { for: 'public', body: () => ({ email: 'nobody@matrix.example' }) },
  resetPassword: {
    for: 'public',
    body: () => ({ ...token(), password: 'long enough for anybody' }),
  },
  confirmEmail: { for: 'public', body: token },
  openInvitation: { for: 'public', body: token },
  acceptInvitation: {
    for: 'public',
    body: () => ({ ...token(), name: 'X', password: 'long enough for anybody' }),
  },
  changePassword: { for: 'signed-in', body: () => ({ current: '', next: '' }) },
  requestEmailChange: { for: 'signed-in', body: () => ({ email: '', password: '' }) },
  listDevices: { for: 'signed-in' },
  signOutOthers: { for: 'signed-in' },
  listInvitations: household({ owner: true }),
  invite: household(
    { owner: true },
    { body: () => ({ email: 'x@matrix.example', name: 'X', role: 'assistant' }) },
  ),
  withdrawInvitation: household(
    { owner: true },
    { params: (w) => ({ id: w.household.id, invitation: w.invitation.id }) },
  ),
  updateMembership: household(
    { owner: true },
    {
      params: (w) => ({ id: w.household.id, membership: w.membershipId }),
      body: () => ({ endsOn: null }),
    },
  ),

  // Households
  listHouseholds: { for: 'signed-in' },
  createHousehold: { for: 'practice', body: () => ({ name: 'New', country: 'GB' }) },
  getReadingQuality: { for: 'practice' },
  getHousehold: household(readers),
  updateHousehold: household(practiceStaff, {
    body: () => ({ hopes: 'Order' }),
    version: (w) => w.household.version,
  }),
  getOutflow: household(readers),
  listMembers: household(readers),
  listFilings: household(readers),
  putFiling: household(staffAnd('decide'), {
    body: () => ({ country: 'GB', taxYear: '2020-21', answer: 'unknown' }),
  }),
  listActivity: household(staffAnd('see')),

  // Boxes and scans
  listAreas: household(staffAnd('see')),
  createArea: household(practiceStaff, { body: () => ({ name: `Area ${Math.random()}` }) }),
  listBoxes: household(staffAnd('see')),
  createBox: household(practiceStaff, { body: () => ({ label: 'New' }) }),
  getBox: box(staffAnd('see')),
  getBoxLabel: box(staffAnd('see')),
  getSeparatorSheet: household(staffAnd('see')),
  uploadScans: box(staffAnd('decide'), { file: Buffer.from('no scan') }),
  listScans: box(staffAnd('see')),
  retryScan: {
    for: staffAnd('decide'),
    about: 'scan',
    params: (w) => ({ id: w.paper.pages[0]?.scanId ?? '' }),
  },
  getPageImage: { for: readers, about: 'paper', params: ofPage },
  getPageThumbnail: { for: readers, about: 'paper', params: ofPage },

  // Papers
  listPapers: household(readers),
  exportPapers: household(staffAnd('export')),
  copyPapers: household(staffAnd('export')),
  copyPaper: paper(staffAnd('export')),
  enterPaper: household(staffAnd('decide'), {
    about: 'kind',
    body: () => ({ class: 'utility-bill', title: 'A bill' }),
  }),
  getPaper: paper(readers),
  updatePaper: paper(staffAnd('decide'), {
    body: () => ({ place: 'Blue folder' }),
    version: paperVersion,
  }),
  undoPaper: paper(staffAnd('decide'), { version: paperVersion }),
  splitPaper: paper(staffAnd('decide'), {
    body: () => ({ beforePage: 2 }),
    version: paperVersion,
  }),
  joinPaper: paper(staffAnd('decide'), {
    body: (w) => ({ with: w.next.id }),
    version: paperVersion,
  }),
  stepDown: paper(
    { owner: true, client: 'approve' },
    { body: () => sameReason, version: paperVersion },
  ),
  departPaper: paper(
    { owner: true, client: 'approve' },
    { body: () => ({ how: 'give-back', on: '2026-11-07' }), version: paperVersion },
  ),
  listPaperChanges: paper(readers),
  getPaperCalendar: paper(readers),

  // Holds and subjects
  listHolds: household(readers),
  placeHold: household(readers, {
    about: 'paper',
    body: (w) => ({ paperId: w.paper.id, kind: 'wish', ...sameReason }),
  }),
  liftHold: {
    for: { ...staffAnd('decide'), adviser: true },
    about: 'paper',
    params: (w) => ({ id: w.hold.id }),
    body: () => sameReason,
  },
  listSubjects: household(readers),
  createSubject: household(staffAnd('decide'), {
    body: () => ({ kind: 'account', name: 'Water' }),
  }),
  updateSubject: {
    for: staffAnd('decide'),
    params: (w) => ({ id: w.subject.id }),
    body: () => ({ name: 'Gas and light' }),
    version: (w) => w.subject.version,
  },

  // Shred lists
  listShredLists: household(readers),
  createShredList: household(practiceStaff, {
    body: (w) => ({ on: '2026-11-07', papers: [w.paper.id] }),
  }),
  getShredList: list(readers),
  getShredListPdf: list(readers),
  getDestructionRecordPdf: list(readers),
  removeShredRow: list(practiceStaff, {
    params: (w) => ({ id: w.list.id, paper: w.list.rows[0]?.paper ?? '' }),
    version: listVersion,
  }),
  sendShredList: list(practiceStaff, { version: listVersion }),
  approveShredList: list(
    { owner: true, client: 'approve' },
    { body: (w) => ({ version: w.list.version, keepBack: [] }) },
  ),
  recordDestruction: list(staffAnd('approve'), {
    body: (w) => ({
      on: '2026-11-07',
      place: 'Kitchen',
      method: 'shredder',
      witness: 'Somebody',
      rows: w.list.rows.map((row) => ({ paper: row.paper, outcome: 'destroyed' })),
    }),
  }),
  voidShredList: list(practiceStaff, { body: () => sameReason, version: listVersion }),

  // Reminders and calendar
  listReminders: household(staffAnd('see')),
  listMail: { for: 'practice' },
  getCalendarAddress: household({ owner: true, client: 'see' }),
  endCalendarAddress: household({ owner: true, client: 'see' }),
  getCalendar: { for: 'public', params: ofHousehold },

  // Rules and service
  listRuleTables: { for: 'signed-in' },
  getRuleTable: { for: 'signed-in', params: () => ({ country: 'GB' }) },
  assessCase: {
    for: 'signed-in',
    body: () => ({ country: 'GB', class: 'payslip', on: '2026-11-07' }),
  },
  getHealth: { for: 'public' },
  getOpenApi: { for: 'public' },
};
