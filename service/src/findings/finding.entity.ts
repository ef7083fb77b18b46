import { type FindingKind } from '@tailrace/shared/core/findings/kinds';
import { type FindingState } from '@tailrace/shared/contracts/findings';
import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** One kind of finding on one valve, living on across assessments. */
@Entity('findings')
@Index('findings_by_valve_and_kind', ['valveId', 'kind'], { unique: true })
@Index('findings_by_number', ['number'], { unique: true })
export class FindingEntity {
  @PrimaryColumn('text') id: string;
  /** what people call it by */
  @Column('integer') number: number;
  @Column('text') valveId: string;
  @Column('text') kind: FindingKind;
  @Column('text') state: FindingState;
  @Column('real') severity: number;
  @Column('real') confidence: number;
  @Column('text') text: string;
  @Column('text', { nullable: true }) explainedBy: FindingKind | null;
  /** ms UTC */
  @Column('integer') firstSeen: number;
  /** ms UTC: the last assessment that supported it */
  @Column('integer') lastSeen: number;
  /** assessments in a row that did not support it */
  @Column('integer') missed: number;
  /** the assessment its figures come from */
  @Column('text') assessmentId: string;
}
