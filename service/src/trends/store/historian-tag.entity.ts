import { Column, Entity, Index, PrimaryGeneratedColumn } from 'typeorm';

/** A historian's name for a point, once; blocks carry its number. */
@Entity('historian_tags')
@Index('historian_tags_by_name', ['name'], { unique: true })
export class HistorianTagEntity {
  @PrimaryGeneratedColumn({ type: 'integer' }) id: number;
  @Column('text') name: string;
}
