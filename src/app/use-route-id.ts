import { useParams } from 'react-router-dom';

/** The id in the address; the table of screens sees to it that it is there. */
export function useRouteId(name: 'householdId' | 'boxId' | 'listId' | 'country'): string {
  const id = useParams()[name];
  if (!id) throw new Error(`The address of this screen has no "${name}".`);
  return id;
}
