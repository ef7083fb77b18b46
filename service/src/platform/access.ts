import { createParamDecorator, ExecutionContext, SetMetadata } from '@nestjs/common';
import { type Action, type Actor } from '@tailrace/shared/contracts/policy';
import { type Request } from 'express';

/** What a route asks of who calls it. A route with neither mark is refused to everyone. */
export const ACCESS = Symbol('access');
export type Access = { readonly open: true } | { readonly signedIn: true } | { readonly action: Action };

/** Anybody may call this route. */
export const Open = () => SetMetadata(ACCESS, { open: true } satisfies Access);
/** Any signed-in person may call this route. */
export const SignedIn = () => SetMetadata(ACCESS, { signedIn: true } satisfies Access);
/** Only roles that may do this action; which areas is decided by the query. */
export const Allow = (action: Action) => SetMetadata(ACCESS, { action } satisfies Access);

export type RequestWithActor = Request & { actor?: Actor };

/** The signed-in person, as far as permission goes. */
export const Who = createParamDecorator((_: unknown, context: ExecutionContext): Actor => {
  const { actor } = context.switchToHttp().getRequest<RequestWithActor>();
  if (!actor) throw new Error('@Who on a route without a signed-in person');
  return actor;
});
