import type { z } from 'zod';
import type { healthSchema } from '../contract/health.ts';
import type { Deps } from '../deps.ts';

/** Whether database, queue and storage answer. */
export async function checkHealth(
  deps: Pick<Deps, 'database' | 'queue' | 'storage'>,
): Promise<z.infer<typeof healthSchema>> {
  const [database, queue, storage] = await Promise.all([
    deps.database.query('select 1').then(
      () => true,
      () => false,
    ),
    deps.queue.check(),
    deps.storage.check(),
  ]);
  const say = (isUp: boolean) => (isUp ? ('up' as const) : ('down' as const));
  return {
    status: say(database && queue && storage),
    database: say(database),
    queue: say(queue),
    storage: say(storage),
  };
}
