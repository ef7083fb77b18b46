import { Controller, Get } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { DataSource } from 'typeorm';
import { z } from 'zod';
import { Open } from './access.js';
import { Problem } from './problem.js';
import { Returns } from './returns.js';

const health = z.object({ state: z.literal('up') });

@ApiTags('operations')
@Controller('health')
export class HealthController {
  constructor(private readonly database: DataSource) {}

  /** Up: the database answers and its schema is the one this build knows. */
  @Get()
  @Open()
  @Returns(health)
  async health(): Promise<z.infer<typeof health>> {
    if (!this.database.isInitialized || (await this.database.showMigrations()))
      throw new Problem('not-ready');
    return { state: 'up' };
  }
}
