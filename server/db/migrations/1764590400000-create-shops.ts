import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Shops first: every later table refers to them. */
export class CreateShops1764590400000 implements MigrationInterface {
  readonly name = 'CreateShops1764590400000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create table "shop" (
        "id" uuid not null,
        "name" text not null,
        "created_at" timestamptz not null default now(),
        constraint "PK_shop" primary key ("id")
      )`);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('drop table "shop"');
  }
}
