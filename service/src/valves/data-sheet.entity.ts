import { type RegisterDataSheet } from '@tailrace/shared/contracts/valves';
import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** One state of a valve's data sheet. Former ones are kept: what was judged against them stays explainable. */
@Entity('data_sheets')
@Index('data_sheets_by_number', ['valveId', 'number'], { unique: true })
@Index('data_sheets_current', ['valveId'], { unique: true, where: 'current = 1' })
export class DataSheetEntity {
  @PrimaryColumn('text') id: string;
  @Column('text') valveId: string;
  @Column('integer') number: number;
  @Column('boolean') current: boolean;
  @Column('simple-json') sheet: RegisterDataSheet;
  /** ms UTC */
  @Column('integer') createdAt: number;
  @Column('text', { nullable: true }) createdBy: string | null;
}
