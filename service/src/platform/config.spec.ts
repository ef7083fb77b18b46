import { mkdtempSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { readConfig } from './config.js';

const folder = () => mkdtempSync(join(tmpdir(), 'tailrace-config-'));

describe('the settings', () => {
  it('work without any, but for a folder to keep data in', () => {
    const config = readConfig({ DATA_DIR: folder() });
    expect(config.port).toBe(4600);
    expect(config.jwtSecret.length).toBeGreaterThanOrEqual(32);
  });

  it('name every variable that is not right and what it must be', () => {
    expect(() => readConfig({ DATA_DIR: folder(), PORT: 'many', COOKIE_SECURE: 'yes' })).toThrow(
      /PORT must be a whole number[^]*COOKIE_SECURE must be on or off/,
    );
  });

  it('refuse a signing secret short enough to be guessed', () => {
    expect(() => readConfig({ DATA_DIR: folder(), JWT_SECRET: 'short' })).toThrow(/JWT_SECRET must have 32/);
  });

  it('say which folder cannot be written', () => {
    const file = join(folder(), 'file');
    writeFileSync(file, '');
    expect(() => readConfig({ DATA_DIR: join(file, 'data') })).toThrow(/DATA_DIR cannot be made or written/);
  });

  it('keep a generated secret across starts, readable by its owner alone', () => {
    const dataDir = folder();
    const first = readConfig({ DATA_DIR: dataDir }).jwtSecret;
    expect(readConfig({ DATA_DIR: dataDir }).jwtSecret).toBe(first);
    expect(statSync(join(dataDir, 'jwt-secret')).mode & 0o077).toBe(0);
  });
});
