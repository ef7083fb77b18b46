import { type Criticality } from '@tailrace/shared/core/data-sheet';
import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn } from 'typeorm';
import { AreaEntity } from '../people/area.entity.js';
import { type DataSheetEntity } from './data-sheet.entity.js';
import { type SignalEntity } from './signal.entity.js';

/** One control valve, known by its tag. What the lists sort by is copied here from its data sheet. */
@Entity('valves')
@Index('valves_by_tag', ['tag'], { unique: true })
@Index('valves_by_area', ['areaId'])
export class ValveEntity {
  @PrimaryColumn('text') id: string;
  @Column('text') tag: string;
  @Column('text') areaId: string;
  @ManyToOne(() => AreaEntity)
  @JoinColumn({ name: 'areaId' })
  area: AreaEntity;
  @Column('text', { nullable: true }) service: string | null;
  @Column('text') criticality: Criticality;
  @Column('boolean') trip: boolean;
  /** rises with each edit; an editor who saw a lower one is refused */
  @Column('integer') version: number;
  /** ms UTC */
  @Column('integer') createdAt: number;
  @Column('integer') updatedAt: number;
  /** the current data sheet and the signals, where the query joins them */
  sheet?: DataSheetEntity;
  signals?: SignalEntity[];
}
