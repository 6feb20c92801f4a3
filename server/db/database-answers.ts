import type { DataSource } from 'typeorm';

const PATIENCE_MS = 2000;

/** Whether the database answers a query within two seconds. Never throws. */
export async function databaseAnswers(source: DataSource): Promise<boolean> {
  let timer: NodeJS.Timeout | undefined;
  const patience = new Promise<boolean>((resolve) => {
    timer = setTimeout(() => resolve(false), PATIENCE_MS);
  });
  try {
    return await Promise.race([source.query('select 1').then(() => true), patience]);
  } catch {
    return false;
  } finally {
    clearTimeout(timer);
  }
}
