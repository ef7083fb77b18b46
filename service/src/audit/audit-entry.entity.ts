import { Column, Entity, Index, PrimaryGeneratedColumn } from 'typeorm';

/** One change that matters: who, when, what, from what to what. Never changed afterwards. */
@Entity('audit_entries')
@Index('audit_entries_by_subject', ['subjectType', 'subjectId'])
export class AuditEntryEntity {
  @PrimaryGeneratedColumn({ type: 'integer' }) number: number;
  /** ms UTC */
  @Column('integer') at: number;
  @Column('text', { nullable: true }) actorId: string | null;
  @Column('text') actorName: string;
  @Column('text') action: string;
  @Column('text') subjectType: string;
  @Column('text') subjectId: string;
  @Column('text', { nullable: true }) areaId: string | null;
  @Column('text', { nullable: true }) before: string | null;
  @Column('text', { nullable: true }) after: string | null;
  /** SHA-256 over this entry and the former entry's hash */
  @Column('text') hash: string;
}
