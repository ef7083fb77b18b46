import { type AddressInfo } from 'node:net';
import { createApp } from './create-app.js';
import { DemoPlant } from './operations/demo-plant.js';
import { FirstStart } from './operations/first-start.js';
import { ConfigError, readConfig } from './platform/config.js';

async function start(): Promise<void> {
  const config = readConfig(process.env);
  const app = await createApp(config);
  await app.init();
  const say = (line: string) => process.stdout.write(`${line}\n`);
  const accounts = config.demo ? await app.get(DemoPlant).bringIn(say) : null;
  if (!config.demo) await app.get(FirstStart).prepare(say);
  await app.listen(config.port, config.host);
  const address = app.getHttpServer().address() as AddressInfo;
  say(`\nTailrace is at http://localhost:${address.port}\n`);
  if (accounts) {
    say(`Demo accounts, all with the password “${config.demoPassword}”:`);
    for (const { role, email } of accounts) say(`  ${role.padEnd(9)} ${email}`);
  }
}

start().catch((error: unknown) => {
  process.stderr.write(
    `${error instanceof ConfigError ? error.message : String((error as Error).stack ?? error)}\n`,
  );
  process.exitCode = 1;
});
