import { LoggerService } from '@nestjs/common';
import { randomUUID } from 'node:crypto';
import { type IncomingMessage, type ServerResponse } from 'node:http';
import { pino, type Logger, type SerializedRequest, type SerializedResponse } from 'pino';
import { pinoHttp } from 'pino-http';
import { type Config } from './config.js';

/** Structured logs; what would open a session is never written. */
export function makeLogger(config: Pick<Config, 'logLevel'>): Logger {
  return pino({
    level: config.logLevel,
    redact: ['req.headers', 'res.headers', '*.authorization', '*.cookie', '*.password', '*.accessToken'],
  });
}

/** One line a request, with its id; health checks and static files are not worth one. */
export function requestLog(logger: Logger) {
  return pinoHttp({
    logger,
    // Of a request only what finds it again: its headers would open a session.
    serializers: {
      req: ({ id, method, url, remoteAddress }: SerializedRequest) => ({
        id,
        method,
        url,
        from: remoteAddress,
      }),
      res: ({ statusCode }: SerializedResponse) => ({ status: statusCode }),
    },
    genReqId: (_request: IncomingMessage, response: ServerResponse) => {
      const id = randomUUID();
      response.setHeader('X-Request-Id', id);
      return id;
    },
    autoLogging: { ignore: (request) => !request.url?.startsWith('/api') || request.url === '/api/health' },
    customLogLevel: (_request, response, error) =>
      error || response.statusCode >= 500 ? 'error' : response.statusCode >= 400 ? 'warn' : 'info',
  });
}

/** Nest's own messages through the same logger. */
export class NestLog implements LoggerService {
  constructor(private readonly logger: Logger) {}
  log(message: unknown, context?: string): void {
    this.logger.debug({ context }, String(message));
  }
  error(message: unknown, stack?: string, context?: string): void {
    this.logger.error({ context, stack }, String(message));
  }
  warn(message: unknown, context?: string): void {
    this.logger.warn({ context }, String(message));
  }
}
