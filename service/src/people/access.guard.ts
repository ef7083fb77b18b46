import { ExecutionContext, Injectable } from '@nestjs/common';
import { Reflector } from '@nestjs/core';
import { AuthGuard } from '@nestjs/passport';
import { type Actor, may } from '@tailrace/shared/contracts/policy';
import { ACCESS, type Access, type RequestWithActor } from '../platform/access.js';
import { Problem } from '../platform/problem.js';

/** Stands before every route: who is not named by `@Open`, `@SignedIn` or `@Allow` does not pass. */
@Injectable()
export class AccessGuard extends AuthGuard('jwt') {
  constructor(private readonly reflector: Reflector) {
    super();
  }

  override async canActivate(context: ExecutionContext): Promise<boolean> {
    const access = this.reflector.getAllAndOverride<Access | undefined>(ACCESS, [
      context.getHandler(),
      context.getClass(),
    ]);
    if (access && 'open' in access) return true;
    if (!(await super.canActivate(context))) throw new Problem('not-signed-in');
    const request = context.switchToHttp().getRequest<RequestWithActor & { user: Actor }>();
    request.actor = request.user;
    const allowed = access && ('signedIn' in access || may(request.actor, access.action));
    if (!allowed) throw new Problem('not-allowed');
    return true;
  }

  override handleRequest<T>(error: unknown, actor: T | false): T {
    if (error instanceof Error) throw error;
    if (!actor) throw new Problem('not-signed-in');
    return actor;
  }
}
