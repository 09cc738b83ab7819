import type { TestProject } from 'vitest/node';
import { startClusterBroker } from '../support/cluster-broker.ts';
import type { ClusterBroker } from '../support/cluster-broker.ts';

declare module 'vitest' {
  export interface ProvidedContext {
    clusterBrokerUrl: string;
  }
}

/** Both projects with a database share one broker, whichever is set up first. */
const shared = globalThis as {
  slackwaterBroker?: { users: number; broker: Promise<ClusterBroker> };
};

/** Offers a throw-away PostgreSQL to the tests that ask for one. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const entry = (shared.slackwaterBroker ??= { users: 0, broker: startClusterBroker() });
  entry.users += 1;
  const broker = await entry.broker;
  project.provide('clusterBrokerUrl', broker.url);
  return async () => {
    entry.users -= 1;
    if (entry.users > 0) return;
    delete shared.slackwaterBroker;
    await broker.close();
  };
}
