import { Global, Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { AuditEntryEntity } from './audit-entry.entity.js';
import { AuditService } from './audit.service.js';

@Global()
@Module({
  imports: [TypeOrmModule.forFeature([AuditEntryEntity])],
  providers: [AuditService],
  exports: [AuditService],
})
export class AuditModule {}
