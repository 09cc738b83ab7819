/** Every address of the client, written once. */
export const paths = {
  signIn: (next?: string) => (next ? `/sign-in?next=${encodeURIComponent(next)}` : '/sign-in'),
  households: () => '/',
  newHousehold: () => '/households/new',
  household: (householdId: string) => `/households/${householdId}`,
  about: (householdId: string) => `/households/${householdId}/about`,
  boxes: (householdId: string) => `/households/${householdId}/boxes`,
  box: (boxId: string) => `/boxes/${boxId}`,
  papers: (householdId: string, query?: Record<string, string>) => {
    const search = query ? new URLSearchParams(query).toString() : '';
    return `/households/${householdId}/papers${search ? `?${search}` : ''}`;
  },
  review: (householdId: string, paperId?: string) =>
    paperId ? `/households/${householdId}/review/${paperId}` : `/households/${householdId}/review`,
  shredLists: (householdId: string) => `/households/${householdId}/shred-lists`,
  shredList: (listId: string) => `/shred-lists/${listId}`,
  holds: (householdId: string) => `/households/${householdId}/holds`,
  subjects: (householdId: string) => `/households/${householdId}/subjects`,
  reminders: (householdId: string) => `/households/${householdId}/reminders`,
  activity: (householdId: string) => `/households/${householdId}/activity`,
  rules: (country?: string) => (country ? `/rules/${country}` : '/rules'),
  mail: () => '/mail',
  readingQuality: () => '/reading-quality',
} as const;
