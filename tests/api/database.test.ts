import { afterEach, expect, inject, test } from 'vitest';
import { guest, operator } from '#server/access/actor.ts';
import { createDataSource } from '#server/db/data-source.ts';
import { migrations } from '#server/db/migrations/list.ts';
import { runMigrations } from '#server/db/run-migrations.ts';
import { createShopService } from '#server/features/shops/shops.service.ts';
import { createShopStore } from '#server/features/shops/shops.store.ts';
import { createTestDatabase, type TestDatabase } from '../support/database.ts';

const open: { destroy(): Promise<void> }[] = [];
afterEach(async () => {
  for (const source of open.splice(0)) await source.destroy();
});

async function connect(database: TestDatabase) {
  const source = createDataSource(database.url);
  await source.initialize();
  open.push(source);
  return source;
}

test('the schema that the migrations make is the one the entities describe', async () => {
  const source = await connect(await createTestDatabase(inject('clusterUrl')));
  const drift = await source.driver.createSchemaBuilder().log();
  expect(drift.upQueries.map((query) => query.query)).toEqual([]);
});

test('two servers that start at once on an empty database migrate it once', async () => {
  const database = await createTestDatabase(inject('clusterUrl'), { migrated: false });
  const ran = await Promise.all([runMigrations(database.url), runMigrations(database.url)]);
  expect(ran.map((names) => names.length).sort()).toEqual([0, migrations.length]);
});

test('every migration can be taken back', async () => {
  const database = await createTestDatabase(inject('clusterUrl'));
  const source = await connect(database);
  for (const _ of migrations) await source.undoLastMigration();
  const tables = await source.query("select table_name from information_schema.tables where table_schema = 'public'");
  expect(tables).toEqual([{ table_name: 'migration' }]);
  expect(await runMigrations(database.url)).toHaveLength(migrations.length);
});

test('the operator makes, lists and renames shops; ids and times come back as stored', async () => {
  const service = createShopService(createShopStore(await connect(await createTestDatabase(inject('clusterUrl')))));
  const made = await service.create(operator, '  Shed <b>2</b>  ');
  expect(made.name).toBe('Shed <b>2</b>');
  expect(Math.abs(made.createdAt.getTime() - Date.now())).toBeLessThan(60_000);
  await service.rename(operator, made.id, "Robert'); drop table shop;--");
  expect((await service.list(operator)).map((shop) => shop.name)).toEqual(["Robert'); drop table shop;--"]);
});

test('a guest may not see or change shops, and nothing reaches the table', async () => {
  const service = createShopService(createShopStore(await connect(await createTestDatabase(inject('clusterUrl')))));
  await expect(service.list(guest)).rejects.toMatchObject({ code: 'not-allowed' });
  await expect(service.create(guest, 'Mine')).rejects.toMatchObject({ code: 'not-allowed' });
  await expect(service.rename(guest, crypto.randomUUID(), 'Mine')).rejects.toMatchObject({ code: 'not-allowed' });
  expect(await service.list(operator)).toEqual([]);
});

test('names of no length or too long, and ids that are not there, are refused', async () => {
  const service = createShopService(createShopStore(await connect(await createTestDatabase(inject('clusterUrl')))));
  await expect(service.create(operator, '   ')).rejects.toMatchObject({ code: 'bad-input' });
  await expect(service.create(operator, 'x'.repeat(121))).rejects.toMatchObject({
    code: 'bad-input',
    details: [{ path: 'name', message: expect.stringContaining('121') }],
  });
  await expect(service.rename(operator, crypto.randomUUID(), 'New')).rejects.toMatchObject({ code: 'not-found' });
  await expect(service.rename(operator, "1' or '1'='1", 'New')).rejects.toMatchObject({ code: 'not-found' });
});
