import { type MigrationInterface, type QueryRunner } from 'typeorm';

export class CreateAudit1764600000001 implements MigrationInterface {
  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`CREATE TABLE audit_entries (
      number integer PRIMARY KEY AUTOINCREMENT NOT NULL,
      at integer NOT NULL,
      actorId text,
      actorName text NOT NULL,
      action text NOT NULL,
      subjectType text NOT NULL,
      subjectId text NOT NULL,
      areaId text,
      before text,
      after text,
      hash text NOT NULL
    )`);
    await runner.query(`CREATE INDEX audit_entries_by_subject ON audit_entries (subjectType, subjectId)`);
    // Append-only even for code that forgets it.
    for (const deed of ['UPDATE', 'DELETE'])
      await runner.query(`CREATE TRIGGER audit_entries_no_${deed.toLowerCase()} BEFORE ${deed} ON audit_entries
        BEGIN SELECT RAISE(ABORT, 'audit entries are never changed'); END`);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`DROP TABLE audit_entries`);
  }
}
