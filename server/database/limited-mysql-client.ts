import { createRequire } from 'node:module';
import type { Knex } from 'knex';

interface Statement {
  sql: string;
  options?: Record<string, unknown>;
}

interface PooledConnection {
  __knex__disposed?: unknown;
  destroy: () => void;
}

/** Knex publishes no types for the classes of its dialects. */
interface Dialect extends Knex.Client {
  _query(connection: PooledConnection, statement: Statement): Promise<unknown>;
}

const MysqlDialect = createRequire(import.meta.url)('knex/lib/dialects/mysql2/index.js') as new (
  config: Knex.Config,
) => Dialect;

/**
 * Knex's own MariaDB client, with values kept out of its errors and a time limit on every statement (`userParams.statementMilliseconds`,
 * 0 = none). Without it a server that has stopped answering, but keeps its connections open, would
 * hold each request for ever.
 */
export class LimitedMysqlClient extends MysqlDialect {
  override async _query(connection: PooledConnection, statement: Statement): Promise<unknown> {
    const { userParams } = this.config as { userParams?: { statementMilliseconds?: number } };
    const limit = userParams?.statementMilliseconds ?? 0;
    if (limit > 0) statement.options = { timeout: limit, ...statement.options };
    try {
      return await super._query(connection, statement);
    } catch (error) {
      if ((error as { code?: string }).code === 'PROTOCOL_SEQUENCE_TIMEOUT') {
        // The late answer would be taken for the next statement's: this connection is lost.
        connection.__knex__disposed = error;
        connection.destroy();
      }
      // The driver adds the statement with all its values; they belong in no log.
      delete (error as { sql?: string }).sql;
      throw error;
    }
  }
}
