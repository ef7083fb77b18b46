import { type AddressInfo } from 'node:net';
import { createApp } from './create-app.js';
import { ConfigError, readConfig } from './platform/config.js';

async function start(): Promise<void> {
  const config = readConfig(process.env);
  const app = await createApp(config);
  await app.listen(config.port, config.host);
  const address = app.getHttpServer().address() as AddressInfo;
  process.stdout.write(`Tailrace is at http://localhost:${address.port}\n`);
}

start().catch((error: unknown) => {
  process.stderr.write(
    `${error instanceof ConfigError ? error.message : String((error as Error).stack ?? error)}\n`,
  );
  process.exitCode = 1;
});
