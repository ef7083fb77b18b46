import { type ColumnPlan, type TakeInReport, type TrendFileState } from '@tailrace/shared/contracts/trends';
import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import { AreaEntity } from '../people/area.entity.js';

/** An uploaded export, its plan and what became of it. The raw bytes are in the file store under its id. */
@Entity('trend_files')
@Index('trend_files_by_number', ['number'], { unique: true })
@Index('trend_files_by_content', ['areaId', 'sha256'], { unique: true })
export class TrendFileEntity {
  @PrimaryColumn('text') id: string;
  @Column('integer') number: number;
  @Column('text') name: string;
  /** bytes */
  @Column('integer') size: number;
  @Column('text') sha256: string;
  @Column('text') areaId: string;
  @ManyToOne(() => AreaEntity)
  @JoinColumn({ name: 'areaId' })
  area: AreaEntity;
  @Column('text', { nullable: true }) receivedBy: string | null;
  @Column('text') receivedByName: string;
  /** ms UTC */
  @Column('integer') receivedAt: number;
  @Column('text') state: TrendFileState;
  /** share read, 0 to 1 */
  @Column('real') share: number;
  @Column('integer') rows: number;
  @Column('simple-json', { nullable: true }) plan: ColumnPlan | null;
  @Column('simple-json', { nullable: true }) report: TakeInReport | null;
  @Column('text', { nullable: true }) refusal: string | null;
}
