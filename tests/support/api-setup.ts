import type { TestProject } from 'vitest/node';
import { makeTemplate, startTestCluster } from './database.ts';

declare module 'vitest' {
  export interface ProvidedContext {
    /** Address of the test cluster; see database.ts. */
    clusterUrl: string;
  }
}

/** Once for all API tests: a PostgreSQL with a migrated template. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const cluster = await startTestCluster();
  await makeTemplate(cluster.url);
  project.provide('clusterUrl', cluster.url);
  return () => cluster.stop();
}
