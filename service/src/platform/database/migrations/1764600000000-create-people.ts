import { type MigrationInterface, type QueryRunner } from 'typeorm';

export class CreatePeople1764600000000 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`CREATE TABLE site (
      id text PRIMARY KEY NOT NULL,
      name text NOT NULL,
      zone text NOT NULL,
      coefficientUnit text NOT NULL,
      barometricPressure real NOT NULL,
      nightlyAt text NOT NULL
    )`);
    await runner.query(`CREATE TABLE areas (
      id text PRIMARY KEY NOT NULL,
      siteId text NOT NULL REFERENCES site (id),
      code text NOT NULL,
      name text NOT NULL
    )`);
    await runner.query(`CREATE UNIQUE INDEX areas_by_code ON areas (siteId, code)`);
    await runner.query(`CREATE TABLE people (
      id text PRIMARY KEY NOT NULL,
      email text NOT NULL,
      name text NOT NULL,
      role text NOT NULL,
      allAreas boolean NOT NULL,
      passwordHash text NOT NULL,
      active boolean NOT NULL,
      createdAt integer NOT NULL
    )`);
    await runner.query(`CREATE UNIQUE INDEX people_by_email ON people (email)`);
    await runner.query(`CREATE TABLE person_areas (
      personId text NOT NULL REFERENCES people (id) ON DELETE CASCADE,
      areaId text NOT NULL REFERENCES areas (id) ON DELETE CASCADE,
      PRIMARY KEY (personId, areaId)
    )`);
    await runner.query(`CREATE TABLE refresh_sessions (
      id text PRIMARY KEY NOT NULL,
      family text NOT NULL,
      personId text NOT NULL REFERENCES people (id) ON DELETE CASCADE,
      tokenHash text NOT NULL,
      createdAt integer NOT NULL,
      expiresAt integer NOT NULL,
      spentAt integer,
      revokedAt integer
    )`);
    await runner.query(`CREATE UNIQUE INDEX refresh_sessions_by_token ON refresh_sessions (tokenHash)`);
    await runner.query(`CREATE INDEX refresh_sessions_by_family ON refresh_sessions (family)`);
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const table of ['refresh_sessions', 'person_areas', 'people', 'areas', 'site'])
      await runner.query(`DROP TABLE ${table}`);
  }
}
