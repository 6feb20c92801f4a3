import type { TestProject } from 'vitest/node';
import { buildProduct } from './build-product.ts';
import { makeTemplate, startTestCluster } from './database.ts';

declare module 'vitest' {
  export interface ProvidedContext {
    /** Address of the test cluster; see database.ts. */
    clusterUrl: string;
  }
}

/** Once for all API tests: the product built, so that launchers and command lines start at once, and a PostgreSQL with a migrated template. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  await buildProduct();
  const cluster = await startTestCluster();
  await makeTemplate(cluster.url);
  project.provide('clusterUrl', cluster.url);
  return () => cluster.stop();
}
