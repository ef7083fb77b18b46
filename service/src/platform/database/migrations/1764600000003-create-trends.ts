import { type MigrationInterface, type QueryRunner } from 'typeorm';

const block = `
  tagId integer NOT NULL REFERENCES historian_tags (id),
  fromTime real NOT NULL,
  toTime real NOT NULL,
  count integer NOT NULL,
  goodCount integer NOT NULL,
  least real,
  greatest real,
  bytes blob NOT NULL`;

export class CreateTrends1764600000003 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      `CREATE TABLE historian_tags (id integer PRIMARY KEY AUTOINCREMENT NOT NULL, name text NOT NULL)`,
    );
    await runner.query(`CREATE UNIQUE INDEX historian_tags_by_name ON historian_tags (name)`);
    await runner.query(`CREATE TABLE trend_files (
      id text PRIMARY KEY NOT NULL,
      number integer NOT NULL,
      name text NOT NULL,
      size integer NOT NULL,
      sha256 text NOT NULL,
      areaId text NOT NULL REFERENCES areas (id),
      receivedBy text,
      receivedByName text NOT NULL,
      receivedAt integer NOT NULL,
      state text NOT NULL,
      share real NOT NULL,
      rows integer NOT NULL,
      plan text,
      report text,
      refusal text
    )`);
    await runner.query(`CREATE UNIQUE INDEX trend_files_by_number ON trend_files (number)`);
    await runner.query(`CREATE UNIQUE INDEX trend_files_by_content ON trend_files (areaId, sha256)`);
    await runner.query(
      `CREATE TABLE sample_blocks (id integer PRIMARY KEY AUTOINCREMENT NOT NULL, ${block})`,
    );
    await runner.query(`CREATE INDEX sample_blocks_by_time ON sample_blocks (tagId, fromTime)`);
    await runner.query(`CREATE TABLE staged_blocks (
      id integer PRIMARY KEY AUTOINCREMENT NOT NULL,
      fileId text NOT NULL REFERENCES trend_files (id) ON DELETE CASCADE, ${block})`);
    await runner.query(`CREATE INDEX staged_blocks_by_file ON staged_blocks (fileId, tagId, fromTime)`);
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const table of ['staged_blocks', 'sample_blocks', 'trend_files', 'historian_tags'])
      await runner.query(`DROP TABLE ${table}`);
  }
}
