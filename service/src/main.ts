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

/** What stopped the start, in words where somebody can mend it. */
function whyNot(error: unknown): string {
  if (error instanceof ConfigError) return error.message;
  const { code, port, stack } = error as NodeJS.ErrnoException & { port?: number };
  if (code === 'EADDRINUSE') return `Tailrace cannot start; port ${port} is in use. Set PORT to another one.`;
  return stack ?? String(error);
}

start().catch((error: unknown) => {
  process.stderr.write(`${whyNot(error)}\n`);
  process.exit(1);
});
