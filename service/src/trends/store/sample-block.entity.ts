import { Column, Entity, Index, PrimaryGeneratedColumn } from 'typeorm';

/** Up to 4,096 samples of one tag, encoded; what is asked of a block without decoding it stands beside it. */
export abstract class BlockColumns {
  @PrimaryGeneratedColumn({ type: 'integer' }) id: number;
  @Column('integer') tagId: number;
  /** s UTC of the first and the last sample */
  @Column('real') fromTime: number;
  @Column('real') toTime: number;
  @Column('integer') count: number;
  @Column('integer') goodCount: number;
  /** smallest and largest good value; null where none is good */
  @Column('real', { nullable: true }) least: number | null;
  @Column('real', { nullable: true }) greatest: number | null;
  @Column('blob') bytes: Uint8Array;
}

@Entity('sample_blocks')
@Index('sample_blocks_by_time', ['tagId', 'fromTime'])
export class SampleBlockEntity extends BlockColumns {}

/** A block of a file that is still being read: not seen by any reader until the file is whole. */
@Entity('staged_blocks')
@Index('staged_blocks_by_file', ['fileId', 'tagId', 'fromTime'])
export class StagedBlockEntity extends BlockColumns {
  @Column('text') fileId: string;
}
