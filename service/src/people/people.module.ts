import { Module } from '@nestjs/common';
import { APP_GUARD } from '@nestjs/core';
import { JwtModule } from '@nestjs/jwt';
import { PassportModule } from '@nestjs/passport';
import { TypeOrmModule } from '@nestjs/typeorm';
import { CONFIG, type Config } from '../platform/config.js';
import { AccessGuard } from './access.guard.js';
import { AreaEntity } from './area.entity.js';
import { JwtStrategy } from './jwt.strategy.js';
import { PeopleController } from './people.controller.js';
import { PeopleService } from './people.service.js';
import { PersonEntity } from './person.entity.js';
import { RefreshSessionEntity } from './refresh-session.entity.js';
import { SessionsController } from './sessions.controller.js';
import { accessSeconds, SessionsService } from './sessions.service.js';
import { SignInTries } from './sign-in-tries.js';
import { SiteEntity } from './site.entity.js';

@Module({
  imports: [
    TypeOrmModule.forFeature([SiteEntity, AreaEntity, PersonEntity, RefreshSessionEntity]),
    PassportModule,
    JwtModule.registerAsync({
      inject: [CONFIG],
      useFactory: (config: Config) => ({
        secret: config.jwtSecret,
        signOptions: { expiresIn: accessSeconds, algorithm: 'HS256' },
      }),
    }),
  ],
  controllers: [SessionsController, PeopleController],
  providers: [
    PeopleService,
    SessionsService,
    SignInTries,
    JwtStrategy,
    { provide: APP_GUARD, useClass: AccessGuard },
  ],
  exports: [PeopleService, TypeOrmModule],
})
export class PeopleModule {}
