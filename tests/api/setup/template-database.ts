import { databaseUrls } from '../../../scripts/setup/databases.mjs';
import { leaseTestCluster } from '../../../scripts/setup/lease.mjs';
import {
  dropRunDatabases,
  ensureTemplate,
  refuseRemote,
  runPrefix,
} from '../../../scripts/setup/template.mjs';
import type { TestProject } from 'vitest/node';

declare module 'vitest' {
  interface ProvidedContext {
    /** The test cluster, the template to clone, and how this run's databases are called. */
    testDatabase: { port: number; bin: string; template: string; prefix: string };
  }
}

/**
 * Before the API tests: the test cluster runs and holds a migrated template, and nothing of earlier runs is left.
 * After them: this run's databases are dropped, and the cluster is stopped when no other run uses it.
 */
export default async function prepareTemplate(project: TestProject): Promise<() => Promise<void>> {
  const cluster = await leaseTestCluster();
  try {
    refuseRemote(databaseUrls(cluster.port, 'postgres').superuser);
    const template = await ensureTemplate(cluster);
    project.provide('testDatabase', { port: cluster.port, bin: cluster.bin, template, prefix: runPrefix() });
  } catch (error) {
    await cluster.release();
    throw error;
  }
  return async () => {
    await dropRunDatabases(cluster, 'w');
    await cluster.release();
  };
}
