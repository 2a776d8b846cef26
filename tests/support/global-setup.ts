import type { TestProject } from 'vitest/node';
import { migrate } from '../../server/database/migrate.ts';
import { openDatabase } from '../../server/database/open-database.ts';
import { listTables, readSchema } from '../../server/database/schema-picture.ts';
import { startThrowawayDatabase } from '../../server/start/throwaway-database.ts';

/** What the workers need to make a database of their own. */
export interface TestDatabaseFacts {
  /** The migrated database: never written to by tests. */
  templateUrl: string;
  templateName: string;
  /** The statements that make its tables and triggers. */
  schema: string[];
  /** Tables that migrations have filled, such as closed lists. */
  filledTables: string[];
}

declare module 'vitest' {
  interface ProvidedContext {
    testDatabase: TestDatabaseFacts;
  }
}

/** Starts a throwaway MariaDB, runs all migrations once, and tells the workers how to copy the result. */
export default async function setUpDatabase(project: TestProject): Promise<() => Promise<void>> {
  const server = await startThrowawayDatabase();
  try {
    await migrate(server.url);
    project.provide('testDatabase', await describeTemplate(server.url));
  } catch (error) {
    await server.stop();
    throw error;
  }
  return server.stop;
}

async function describeTemplate(url: string): Promise<TestDatabaseFacts> {
  const db = openDatabase(url, { poolMax: 1 });
  try {
    const filledTables: string[] = [];
    for (const table of await listTables(db)) {
      if ((await db(table).first()) !== undefined) filledTables.push(table);
    }
    return {
      templateUrl: url,
      templateName: new URL(url).pathname.slice(1),
      schema: await readSchema(db),
      filledTables,
    };
  } finally {
    await db.destroy();
  }
}
