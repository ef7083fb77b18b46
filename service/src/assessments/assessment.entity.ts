import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/**
 * One assessment of one valve, frozen. What the ranking reads stands in columns of its own, so that a page of
 * valves does not parse a page of whole assessments.
 */
@Entity('assessments')
@Index('assessments_by_valve', ['valveId', 'assessedAt'])
@Index('assessments_latest', ['valveId'], { unique: true, where: 'latest = 1' })
export class AssessmentEntity {
  @PrimaryColumn('text') id: string;
  @Column('text') valveId: string;
  @Column('text') runId: string;
  @Column('integer') runNumber: number;
  /** ms UTC */
  @Column('integer') assessedAt: number;
  /** ms UTC */
  @Column('integer') windowFrom: number;
  @Column('integer') windowTo: number;
  @Column('text') methodVersion: string;
  @Column('boolean') judged: boolean;
  @Column('text', { nullable: true }) reason: string | null;
  @Column('real', { nullable: true }) attention: number | null;
  /** severity × confidence of the strongest counted finding: breaks ties of attention (methods.md §9.3) */
  @Column('real') strongest: number;
  /** the one assessment of this valve that the ranking shows */
  @Column('boolean') latest: boolean;
  /** the ridge and the glyph of the ranking row, JSON */
  @Column('text') card: string;
  /** PresentedAssessment, JSON */
  @Column('text', { select: false }) result: string;
}
