import { buildForTests } from './product-build';

/** The production build that live, fault and end-to-end tests run on. */
export default async function globalBuild(): Promise<void> {
  await buildForTests();
}
