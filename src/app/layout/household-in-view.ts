import { createContext, useContext, useEffect } from 'react';

/** Tells the layout which household a screen belongs to, where the address does not say so. */
export const HouseholdInViewContext = createContext<(householdId: string | null) => void>(() => {});

/** For screens whose address names a box or a list: names the household once it is known. */
export function useHouseholdInView(householdId: string | undefined): void {
  const setHouseholdId = useContext(HouseholdInViewContext);
  useEffect(() => {
    if (householdId) setHouseholdId(householdId);
  }, [householdId, setHouseholdId]);
}
