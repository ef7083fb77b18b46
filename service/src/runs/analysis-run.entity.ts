import { type RunState } from '@tailrace/shared/contracts/runs';
import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** One pass over many valves, scheduled or asked for. */
@Entity('analysis_runs')
@Index('analysis_runs_by_number', ['number'], { unique: true })
@Index('analysis_runs_by_state', ['state'])
export class AnalysisRunEntity {
  @PrimaryColumn('text') id: string;
  @Column('integer') number: number;
  @Column('text') state: RunState;
  @Column('text') trigger: 'schedule' | 'person' | 'seed';
  @Column('text', { nullable: true }) requestedBy: string | null;
  @Column('text', { nullable: true }) requestedByName: string | null;
  /** ms UTC */
  @Column('integer') createdAt: number;
  @Column('integer', { nullable: true }) startedAt: number | null;
  @Column('integer', { nullable: true }) finishedAt: number | null;
  /** window asked for, ms UTC; null: the default window of each valve */
  @Column('integer', { nullable: true }) windowFrom: number | null;
  @Column('integer', { nullable: true }) windowTo: number | null;
}
