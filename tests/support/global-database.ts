import type { TestProject } from 'vitest/node';
import { makeTemplates } from './template-database';
import { startThrowawayCluster, type ThrowawayCluster } from './throwaway-cluster';

declare module 'vitest' {
  interface ProvidedContext {
    adminUrl: string;
  }
}

/** Gives the tests a database server: the one of `npm test`, or one of this run's own. */
export default async function globalDatabase(project: TestProject): Promise<() => Promise<void>> {
  const given = process.env.FASCICLE_TEST_ADMIN_URL;
  const own: ThrowawayCluster | null = given === undefined ? await startThrowawayCluster() : null;
  const adminUrl = own?.adminUrl ?? given ?? '';
  process.env.FASCICLE_TEST_ADMIN_URL = adminUrl;
  await makeTemplates(adminUrl);
  project.provide('adminUrl', adminUrl);
  return async () => {
    if (own === null) return;
    delete process.env.FASCICLE_TEST_ADMIN_URL;
    await own.remove();
  };
}
