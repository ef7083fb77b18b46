import { Inject, Injectable } from '@nestjs/common';
import { PassportStrategy } from '@nestjs/passport';
import { type Actor } from '@tailrace/shared/contracts/policy';
import { ExtractJwt, Strategy } from 'passport-jwt';
import { CONFIG, type Config } from '../platform/config.js';
import { actorOf } from './actor-of.js';
import { type AccessClaims, SessionsService } from './sessions.service.js';

/** The bearer of an access token becomes an actor; role and areas are read fresh, so a change holds at once. */
@Injectable()
export class JwtStrategy extends PassportStrategy(Strategy) {
  constructor(
    @Inject(CONFIG) config: Config,
    private readonly sessions: SessionsService,
  ) {
    super({
      jwtFromRequest: ExtractJwt.fromAuthHeaderAsBearerToken(),
      secretOrKey: config.jwtSecret,
      algorithms: ['HS256'],
    });
  }

  async validate(claims: AccessClaims): Promise<Actor | false> {
    const person = await this.sessions.personOf(claims);
    return person ? actorOf(person) : false;
  }
}
