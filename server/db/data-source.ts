import { DataSource } from 'typeorm';
import { shopEntity } from '#server/features/shops/shops.entity.ts';
import { migrations } from './migrations/list.ts';

const CONNECT_TIMEOUT_MS = 5000;
const STATEMENT_TIMEOUT_MS = 15_000;

/** A data source that never changes the schema by itself: migrations only.
 *  @param statementTimeout longest time of one statement [ms]; 0 = no limit */
export function createDataSource(url: string, { statementTimeout = STATEMENT_TIMEOUT_MS } = {}): DataSource {
  return new DataSource({
    type: 'postgres',
    url,
    entities: [shopEntity],
    migrations,
    migrationsTableName: 'migration',
    migrationsTransactionMode: 'each',
    synchronize: false,
    migrationsRun: false,
    uuidExtension: 'pgcrypto',
    installExtensions: false,
    invalidWhereValuesBehavior: { null: 'throw', undefined: 'throw' },
    connectTimeoutMS: CONNECT_TIMEOUT_MS,
    poolSize: 10,
    extra: { statement_timeout: statementTimeout },
    // An idle connection that breaks is replaced by the pool; the next query, or /api/health, reports what matters.
    poolErrorHandler: () => {},
  });
}
