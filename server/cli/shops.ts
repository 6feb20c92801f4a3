/** npm run -s shops: what the operator of a server may do with its shops, on the machine itself. */

import { operator } from '#server/access/actor.ts';
import { configProblem, readConfig } from '#server/config.ts';
import { createDataSource } from '#server/db/data-source.ts';
import { databasePlace, databaseProblem } from '#server/db/database-problem.ts';
import { runMigrations } from '#server/db/run-migrations.ts';
import { AppError } from '#server/errors.ts';
import { createShopService, type ShopService } from '#server/features/shops/shops.service.ts';
import { createShopStore } from '#server/features/shops/shops.store.ts';

const USAGE = `Usage (with DATABASE_URL set):
  npm run -s shops -- list
  npm run -s shops -- create NAME
  npm run -s shops -- rename ID NAME`;

async function obey(service: ShopService, [command, ...words]: readonly string[]): Promise<string | null> {
  if (command === 'list' && words.length === 0) {
    const shops = await service.list(operator);
    return shops.map((shop) => `${shop.id}  ${shop.createdAt.toISOString()}  ${shop.name}`).join('\n') || 'No shops yet.';
  }
  if (command === 'create' && words.length === 1) return (await service.create(operator, words[0] as string)).id;
  if (command === 'rename' && words.length === 2) {
    await service.rename(operator, words[0] as string, words[1] as string);
    return 'Renamed.';
  }
  return null;
}

async function run(args: readonly string[]): Promise<{ code: number; words: string }> {
  const config = readConfig(process.env);
  if (!config.ok) return { code: 2, words: configProblem(config.problems) };
  const url = config.value.databaseUrl;
  if (!url) return { code: 2, words: USAGE };
  const source = createDataSource(url);
  try {
    await runMigrations(url);
    await source.initialize();
    const words = await obey(createShopService(createShopStore(source)), args);
    return words === null ? { code: 2, words: USAGE } : { code: 0, words };
  } catch (error) {
    const sentence = error instanceof AppError ? error.message : databaseProblem(error, databasePlace(url));
    if (!sentence) throw error;
    return { code: 2, words: sentence };
  } finally {
    if (source.isInitialized) await source.destroy();
  }
}

const { code, words } = await run(process.argv.slice(2));
(code === 0 ? process.stdout : process.stderr).write(`${words}\n`);
process.exitCode = code;
