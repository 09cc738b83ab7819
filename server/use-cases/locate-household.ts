import { findHouseholdOf, type RecordKind } from '../db/repositories/household-repository.ts';

/** The household and practice that a record belongs to; null when there is no such record. */
export function locateHousehold(
  kind: RecordKind,
  id: string,
): Promise<{ id: string; practiceId: string } | null> {
  return findHouseholdOf(kind, id);
}
