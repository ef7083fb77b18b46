import { type ValveOutcome } from '@tailrace/shared/contracts/runs';
import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** What became of one valve in one run: the queue's row and its record. */
@Entity('run_valves')
@Index('run_valves_by_outcome', ['runId', 'outcome'])
@Index('run_valves_by_valve', ['valveId'])
export class RunValveEntity {
  @PrimaryColumn('text') runId: string;
  @PrimaryColumn('text') valveId: string;
  @Column('text') outcome: ValveOutcome['outcome'];
  @Column('text', { nullable: true }) reason: string | null;
  @Column('integer') findings: number;
  /** ms of computing */
  @Column('real', { nullable: true }) took: number | null;
}
