import type { TestProject } from 'vitest/node';
import { startProduct, type DemoAccount } from '../support/product.ts';

declare module 'vitest' {
  interface ProvidedContext {
    baseUrl: string;
    demoAccounts: readonly DemoAccount[];
    dataFolder: string;
  }
}

/** The browser tests walk through what people get, not through a set-up made for tests. */
export default async function setUpProduct(project: TestProject): Promise<() => Promise<void>> {
  const { baseUrl, dataFolder, demoAccounts, stop } = await startProduct();
  project.provide('baseUrl', baseUrl);
  project.provide('dataFolder', dataFolder);
  project.provide('demoAccounts', demoAccounts);
  return stop;
}
