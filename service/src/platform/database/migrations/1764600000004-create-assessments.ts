import { type MigrationInterface, type QueryRunner } from 'typeorm';

export class CreateAssessments1764600000004 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`CREATE TABLE analysis_runs (
      id text PRIMARY KEY NOT NULL,
      number integer NOT NULL,
      state text NOT NULL,
      trigger text NOT NULL,
      requestedBy text,
      requestedByName text,
      createdAt integer NOT NULL,
      startedAt integer,
      finishedAt integer,
      windowFrom integer,
      windowTo integer
    )`);
    await runner.query(`CREATE UNIQUE INDEX analysis_runs_by_number ON analysis_runs (number)`);
    await runner.query(`CREATE INDEX analysis_runs_by_state ON analysis_runs (state)`);
    await runner.query(`CREATE TABLE run_valves (
      runId text NOT NULL REFERENCES analysis_runs (id) ON DELETE CASCADE,
      valveId text NOT NULL REFERENCES valves (id) ON DELETE CASCADE,
      outcome text NOT NULL,
      reason text,
      findings integer NOT NULL,
      took real,
      PRIMARY KEY (runId, valveId)
    )`);
    await runner.query(`CREATE INDEX run_valves_by_outcome ON run_valves (runId, outcome)`);
    await runner.query(`CREATE INDEX run_valves_by_valve ON run_valves (valveId)`);
    await runner.query(`CREATE TABLE assessments (
      id text PRIMARY KEY NOT NULL,
      valveId text NOT NULL REFERENCES valves (id) ON DELETE CASCADE,
      runId text NOT NULL REFERENCES analysis_runs (id),
      runNumber integer NOT NULL,
      assessedAt integer NOT NULL,
      windowFrom integer NOT NULL,
      windowTo integer NOT NULL,
      methodVersion text NOT NULL,
      judged boolean NOT NULL,
      reason text,
      attention real,
      strongest real NOT NULL,
      latest boolean NOT NULL,
      card text NOT NULL,
      result text NOT NULL
    )`);
    await runner.query(`CREATE INDEX assessments_by_valve ON assessments (valveId, assessedAt)`);
    await runner.query(`CREATE UNIQUE INDEX assessments_latest ON assessments (valveId) WHERE latest = 1`);
    await runner.query(`CREATE TABLE findings (
      id text PRIMARY KEY NOT NULL,
      number integer NOT NULL,
      valveId text NOT NULL REFERENCES valves (id) ON DELETE CASCADE,
      kind text NOT NULL,
      state text NOT NULL,
      severity real NOT NULL,
      confidence real NOT NULL,
      text text NOT NULL,
      explainedBy text,
      firstSeen integer NOT NULL,
      lastSeen integer NOT NULL,
      missed integer NOT NULL,
      assessmentId text NOT NULL REFERENCES assessments (id)
    )`);
    await runner.query(`CREATE UNIQUE INDEX findings_by_valve_and_kind ON findings (valveId, kind)`);
    await runner.query(`CREATE UNIQUE INDEX findings_by_number ON findings (number)`);
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const table of ['findings', 'assessments', 'run_valves', 'analysis_runs'])
      await runner.query(`DROP TABLE ${table}`);
  }
}
