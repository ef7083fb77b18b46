import { DynamicModule, Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { join } from 'node:path';
import { type DataSourceOptions } from 'typeorm';
import { type Config } from '../config.js';
import { migrations } from './migrations.js';

interface Pragmas {
  pragma(source: string): unknown;
}

/** One SQLite file; its schema comes from migrations alone, run at start. */
export function databaseOptions(config: Pick<Config, 'dataDir'>): DataSourceOptions {
  return {
    type: 'better-sqlite3',
    database: join(config.dataDir, 'tailrace.db'),
    enableWAL: true,
    migrations,
    migrationsRun: true,
    synchronize: false,
    prepareDatabase: (db: unknown) => {
      const database = db as Pragmas;
      database.pragma('busy_timeout = 5000');
      database.pragma('foreign_keys = ON');
      database.pragma('synchronous = NORMAL');
    },
  };
}

@Module({})
export class DatabaseModule {
  static forRoot(config: Pick<Config, 'dataDir'>): DynamicModule {
    return {
      module: DatabaseModule,
      imports: [TypeOrmModule.forRoot({ ...databaseOptions(config), autoLoadEntities: true })],
    };
  }
}
