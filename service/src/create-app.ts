import { NestFactory } from '@nestjs/core';
import { type NestExpressApplication } from '@nestjs/platform-express';
import { DocumentBuilder, SwaggerModule } from '@nestjs/swagger';
import compression from 'compression';
import cookieParser from 'cookie-parser';
import { AppModule } from './app.module.js';
import { type Config } from './platform/config.js';
import { serveDashboard } from './platform/dashboard.js';
import { makeLogger, NestLog, requestLog } from './platform/request-log.js';
import { securityHeaders } from './platform/security-headers.js';

/** ms: Node's own five minutes would cut a large trend file on a slow line */
const longestRequest = 4 * 3_600_000;

/** The whole service, ready to listen: what main, the tests and the seed start from. */
export async function createApp(config: Config): Promise<NestExpressApplication> {
  const logger = makeLogger(config);
  const app = await NestFactory.create<NestExpressApplication>(AppModule.forRoot(config), {
    logger: new NestLog(logger),
    abortOnError: false,
  });
  app.set('trust proxy', config.trustProxy);
  app.disable('x-powered-by');
  app.getHttpServer().requestTimeout = longestRequest;
  app.use(requestLog(logger));
  app.use(securityHeaders(config));
  app.use(compression());
  app.use(cookieParser());
  app.useBodyParser('json', { limit: '1mb' });
  app.setGlobalPrefix('api');
  app.enableShutdownHooks();
  const description = new DocumentBuilder()
    .setTitle('Tailrace')
    .setDescription('Trends in, assessments and the ranking out. Refusals are problem details (RFC 9457).')
    .addBearerAuth()
    .build();
  SwaggerModule.setup('api/docs', app, () => SwaggerModule.createDocument(app, description), {
    jsonDocumentUrl: 'api/docs-json',
    customSiteTitle: 'Tailrace API',
  });
  serveDashboard(app);
  return app;
}
