import { type MigrationInterface, type QueryRunner } from 'typeorm';

export class CreateValves1764600000002 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`CREATE TABLE valves (
      id text PRIMARY KEY NOT NULL,
      tag text NOT NULL COLLATE NOCASE,
      areaId text NOT NULL REFERENCES areas (id),
      service text,
      criticality text NOT NULL,
      trip boolean NOT NULL,
      version integer NOT NULL,
      createdAt integer NOT NULL,
      updatedAt integer NOT NULL
    )`);
    await runner.query(`CREATE UNIQUE INDEX valves_by_tag ON valves (tag)`);
    await runner.query(`CREATE INDEX valves_by_area ON valves (areaId)`);
    await runner.query(`CREATE TABLE data_sheets (
      id text PRIMARY KEY NOT NULL,
      valveId text NOT NULL REFERENCES valves (id) ON DELETE CASCADE,
      number integer NOT NULL,
      current boolean NOT NULL,
      sheet text NOT NULL,
      createdAt integer NOT NULL,
      createdBy text
    )`);
    await runner.query(`CREATE UNIQUE INDEX data_sheets_by_number ON data_sheets (valveId, number)`);
    await runner.query(`CREATE UNIQUE INDEX data_sheets_current ON data_sheets (valveId) WHERE current = 1`);
    await runner.query(`CREATE TABLE signals (
      id text PRIMARY KEY NOT NULL,
      valveId text NOT NULL REFERENCES valves (id) ON DELETE CASCADE,
      role text NOT NULL,
      historianTag text NOT NULL,
      unit text,
      reversed boolean NOT NULL
    )`);
    await runner.query(`CREATE UNIQUE INDEX signals_by_role ON signals (valveId, role)`);
    await runner.query(`CREATE INDEX signals_by_tag ON signals (historianTag)`);
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const table of ['signals', 'data_sheets', 'valves']) await runner.query(`DROP TABLE ${table}`);
  }
}
