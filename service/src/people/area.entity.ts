import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** One unit of the site. People see the valves of their areas and no others. */
@Entity('areas')
@Index('areas_by_code', ['siteId', 'code'], { unique: true })
export class AreaEntity {
  @PrimaryColumn('text') id: string;
  @Column('text') siteId: string;
  @Column('text') code: string;
  @Column('text') name: string;
}
