import { DynamicModule, Global, Module } from '@nestjs/common';
import { APP_FILTER, APP_GUARD, APP_INTERCEPTOR, APP_PIPE, Reflector } from '@nestjs/core';
import { StandardSchemaSerializerInterceptor, StandardSchemaValidationPipe } from '@nestjs/common';
import { ThrottlerGuard, ThrottlerModule } from '@nestjs/throttler';
import { Clock } from './clock.js';
import { CONFIG, type Config } from './config.js';
import { DatabaseModule } from './database/database.module.js';
import { Transactions } from './database/transactions.js';
import { HealthController } from './health.controller.js';
import { inputProblem } from './input-problem.js';
import { ProblemFilter } from './problem.filter.js';

/** What every other module stands on: settings, clock, database, checks of what comes in and of what goes out. */
@Global()
@Module({})
export class PlatformModule {
  static forRoot(config: Config): DynamicModule {
    return {
      module: PlatformModule,
      imports: [
        DatabaseModule.forRoot(config),
        ThrottlerModule.forRoot({ throttlers: [{ ttl: 60_000, limit: 1200 }] }),
      ],
      controllers: [HealthController],
      providers: [
        { provide: CONFIG, useValue: config },
        Clock,
        Transactions,
        { provide: APP_GUARD, useClass: ThrottlerGuard },
        { provide: APP_FILTER, useClass: ProblemFilter },
        {
          provide: APP_PIPE,
          useFactory: () => new StandardSchemaValidationPipe({ exceptionFactory: inputProblem }),
        },
        {
          provide: APP_INTERCEPTOR,
          inject: [Reflector],
          useFactory: (reflector: Reflector) => new StandardSchemaSerializerInterceptor(reflector),
        },
      ],
      exports: [CONFIG, Clock, Transactions],
    };
  }
}
