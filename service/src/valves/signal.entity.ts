import { type SignalRole } from '@tailrace/shared/core/series';
import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** One historian tag bound to one role of one valve. */
@Entity('signals')
@Index('signals_by_role', ['valveId', 'role'], { unique: true })
@Index('signals_by_tag', ['historianTag'])
export class SignalEntity {
  @PrimaryColumn('text') id: string;
  @Column('text') valveId: string;
  @Column('text') role: SignalRole;
  @Column('text') historianTag: string;
  @Column('text', { nullable: true }) unit: string | null;
  /** the signal rises as the valve closes */
  @Column('boolean') reversed: boolean;
}
