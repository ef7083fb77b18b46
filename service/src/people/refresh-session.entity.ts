import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** One refresh token. Each use spends it and makes the next of its family; a spent one that comes back ends the family. */
@Entity('refresh_sessions')
@Index('refresh_sessions_by_token', ['tokenHash'], { unique: true })
@Index('refresh_sessions_by_family', ['family'])
export class RefreshSessionEntity {
  @PrimaryColumn('text') id: string;
  @Column('text') family: string;
  @Column('text') personId: string;
  /** SHA-256 of the token; the token itself is never stored */
  @Column('text') tokenHash: string;
  @Column('integer') createdAt: number;
  @Column('integer') expiresAt: number;
  @Column('integer', { nullable: true }) spentAt: number | null;
  @Column('integer', { nullable: true }) revokedAt: number | null;
}
