import { Body, Controller, Delete, HttpCode, Inject, Post, Req, Res } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { Throttle } from '@nestjs/throttler';
import { type Session, session, signInDraft, type SignInDraft } from '@tailrace/shared/contracts/people';
import { type Request, type Response } from 'express';
import { Open } from '../platform/access.js';
import { CONFIG, type Config } from '../platform/config.js';
import { Problem } from '../platform/problem.js';
import { Returns } from '../platform/returns.js';
import { actorOf } from './actor-of.js';
import { PeopleService } from './people.service.js';
import { accessSeconds, type OpenedSession, refreshLife, SessionsService } from './sessions.service.js';

const cookieName = 'tailrace_refresh';

@ApiTags('session')
@Controller('session')
export class SessionsController {
  constructor(
    private readonly sessions: SessionsService,
    private readonly people: PeopleService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  /** Sign in: an access token in the answer, a refresh token in a cookie scripts cannot read. */
  @Post()
  @Open()
  @HttpCode(200)
  @Throttle({ default: { limit: 60, ttl: 60_000 } })
  @Returns(session)
  async signIn(
    @Body({ schema: signInDraft }) draft: SignInDraft,
    @Res({ passthrough: true }) response: Response,
  ): Promise<Session> {
    return this.answer(await this.sessions.signIn(draft), response);
  }

  /** A new access token for the refresh cookie, which is replaced by its successor. */
  @Post('refresh')
  @Open()
  @HttpCode(200)
  @Throttle({ default: { limit: 120, ttl: 60_000 } })
  @Returns(session)
  async refresh(@Req() request: Request, @Res({ passthrough: true }) response: Response): Promise<Session> {
    const token = cookieOf(request);
    if (!token) throw new Problem('session-ended');
    try {
      return await this.answer(await this.sessions.refresh(token), response);
    } catch (error) {
      if (error instanceof Problem) this.clear(response);
      throw error;
    }
  }

  /** Sign out: the session and every token of it end. */
  @Delete()
  @Open()
  @HttpCode(204)
  async signOut(@Req() request: Request, @Res({ passthrough: true }) response: Response): Promise<void> {
    const token = cookieOf(request);
    if (token) await this.sessions.signOut(token);
    this.clear(response);
  }

  private async answer(opened: OpenedSession, response: Response): Promise<Session> {
    response.cookie(cookieName, opened.refreshToken, { ...this.cookie(), maxAge: refreshLife });
    return {
      accessToken: opened.accessToken,
      expiresIn: accessSeconds,
      me: await this.people.me(actorOf(opened.person)),
    };
  }

  private clear(response: Response): void {
    response.clearCookie(cookieName, this.cookie());
  }

  private cookie() {
    return {
      httpOnly: true,
      sameSite: 'strict',
      secure: this.config.cookieSecure,
      path: '/api/session',
    } as const;
  }
}

function cookieOf(request: Request): string | null {
  const cookies = request.cookies as Record<string, unknown>;
  const token = cookies[cookieName];
  return typeof token === 'string' && token.length > 0 ? token : null;
}
