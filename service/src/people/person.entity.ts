import { type Role } from '@tailrace/shared/contracts/policy';
import { Column, Entity, Index, JoinTable, ManyToMany, PrimaryColumn } from 'typeorm';
import { AreaEntity } from './area.entity.js';

@Entity('people')
@Index('people_by_email', ['email'], { unique: true })
export class PersonEntity {
  @PrimaryColumn('text') id: string;
  @Column('text') email: string;
  @Column('text') name: string;
  @Column('text') role: Role;
  @Column('boolean') allAreas: boolean;
  @Column('text', { select: false }) passwordHash: string;
  @Column('boolean') active: boolean;
  /** ms UTC */
  @Column('integer') createdAt: number;
  @ManyToMany(() => AreaEntity)
  @JoinTable({
    name: 'person_areas',
    joinColumn: { name: 'personId' },
    inverseJoinColumn: { name: 'areaId' },
  })
  areas: AreaEntity[];
}
