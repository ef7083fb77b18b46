import { ArgumentsHost, Catch, ExceptionFilter, HttpException } from '@nestjs/common';
import { ThrottlerException } from '@nestjs/throttler';
import { type ProblemDetails, type ProblemKind, problemKinds } from '@tailrace/shared/contracts/problems';
import { problemSentence } from '@tailrace/shared/messages/problems';
import { type Request, type Response } from 'express';
import { Problem } from './problem.js';

const kindOfStatus: Partial<Record<number, ProblemKind>> = {
  400: 'invalid-input',
  401: 'not-signed-in',
  403: 'not-allowed',
  404: 'not-found',
  413: 'too-large',
  429: 'too-many-requests',
  503: 'not-ready',
};

/** Whatever was thrown, as a Problem. What nobody foresaw becomes `unexpected`, with its cause for the log. */
export function asProblem(thrown: unknown): Problem {
  if (thrown instanceof Problem) return thrown;
  if (thrown instanceof ThrottlerException) return new Problem('too-many-requests');
  if (thrown instanceof HttpException) return fromHttp(thrown);
  const { type } = thrown as { type?: unknown };
  if (type === 'entity.parse.failed') return new Problem('invalid-input', 'body-not-json');
  if (type === 'entity.too.large') return new Problem('too-large', 'body-too-large');
  return new Problem('unexpected', null, [], { cause: thrown });
}

function fromHttp(thrown: HttpException): Problem {
  const kind = kindOfStatus[thrown.getStatus()];
  if (kind === undefined) return new Problem('unexpected', null, [], { cause: thrown });
  if (kind === 'not-found') return new Problem('not-found', 'no-such-route');
  if (kind === 'invalid-input' && /JSON/.test(thrown.message))
    return new Problem('invalid-input', 'body-not-json');
  if (kind === 'too-large') return new Problem('too-large', 'body-too-large');
  return new Problem(kind);
}

/** Every refusal and fault of the API in one shape (RFC 9457 problem details). */
@Catch()
export class ProblemFilter implements ExceptionFilter {
  catch(thrown: unknown, host: ArgumentsHost): void {
    const request = host.switchToHttp().getRequest<Request & { id?: string }>();
    const response = host.switchToHttp().getResponse<Response>();
    const problem = asProblem(thrown);
    const { status, title } = problemKinds[problem.kind];
    if (problem.kind === 'unexpected')
      request.log.error({ err: problem.cause ?? problem }, 'unexpected fault');
    if (response.headersSent) {
      response.destroy();
      return;
    }
    const body: ProblemDetails = {
      type: `/problems/${problem.kind}`,
      title,
      status,
      detail:
        problem.detail !== null && typeof problem.detail === 'object'
          ? problem.detail.text
          : problemSentence(problem.kind, problem.detail),
      instance: String(request.id ?? ''),
      ...(problem.errors.length > 0 ? { errors: [...problem.errors] } : {}),
    };
    response.status(status).type('application/problem+json').json(body);
  }
}
