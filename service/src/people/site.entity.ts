import { Column, Entity, PrimaryColumn } from 'typeorm';

/** The plant. One installation serves one site. */
@Entity('site')
export class SiteEntity {
  @PrimaryColumn('text') id: string;
  @Column('text') name: string;
  /** IANA zone */
  @Column('text') zone: string;
  @Column('text') coefficientUnit: 'Cv' | 'Kv';
  /** kPa(a) */
  @Column('real') barometricPressure: number;
  /** HH:mm, local: when the nightly analysis is due */
  @Column('text') nightlyAt: string;
}
