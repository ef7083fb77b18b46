import { type Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { openBrowser, openPage, signIn } from './browser';

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

const password = 'tailrace-demo';

/** Four days of a valve nobody has registered, in local time with a row that cannot be read. */
function anExport(): string {
  const rows = ['timestamp,FV-1101.OP,NEW-77.FLOW [m3/h]'];
  for (let i = 0; i < 400; i++) {
    const time = new Date(Date.UTC(2026, 10, 30, 0, 5 * i)).toISOString();
    rows.push(`${i === 200 ? 'no time here' : time},${40 + (i % 30)},${(20 + (i % 7)).toFixed(1)}`);
  }
  return `${rows.join('\n')}\n`;
}

describe('an operator', () => {
  test('is told when the password is wrong, and comes to the page asked for when it is right', async () => {
    const { page, context } = await openPage(browser, inject('url'));
    await page.goto('/trends');
    await page.getByLabel('E-mail').fill('operator@tailrace.example');
    await page.getByLabel('Password').fill('wrong');
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.getByText('E-mail or password is wrong').waitFor();
    await page.getByLabel('Password').fill(password);
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.waitForURL('**/trends');
    await page.getByRole('heading', { name: 'Trends' }).waitFor();
    await context.close();
  });

  test('brings a trend file in and sees what was taken and what was rejected, by line', async () => {
    const { page, context, errors } = await openPage(browser, inject('url'));
    await signIn(page, 'operator@tailrace.example', password);
    await page.goto('/trends');
    await page
      .getByRole('link', { name: 'Bring in a trend file' })
      .or(page.getByRole('button', { name: 'Bring in a trend file' }))
      .click();
    await page.getByLabel('Area whose valves it is about').click();
    await page.getByRole('option', { name: 'Washing and milling' }).click();
    await page
      .getByLabel('Trend file')
      .setInputFiles({ name: 'shift-export.csv', mimeType: 'text/csv', buffer: Buffer.from(anExport()) });
    await page.getByRole('button', { name: 'Go on to plan and signals' }).click();
    await page.getByRole('table', { name: 'Tags of the file and their signals' }).waitFor();
    await page.getByText('FV-1101, demand').waitFor();
    await page.getByRole('button', { name: 'Go on to take in' }).click();
    await page.getByRole('button', { name: 'Take it in' }).click();
    await page.getByText('1 reject is listed below').waitFor();
    const sheet = await page.locator('main').innerText();
    expect(sheet).toContain('time not understood');
    expect(sheet).toContain('202');
    expect(sheet).toContain('NEW-77.FLOW');
    expect(errors).toEqual([]);
    await context.close();
  });

  test('reads why a file is refused and that nothing of it was kept', async () => {
    const { page, context } = await openPage(browser, inject('url'));
    await signIn(page, 'operator@tailrace.example', password);
    await page.goto('/trends/new');
    await page.getByLabel('Area whose valves it is about').click();
    await page.getByRole('option', { name: 'Extraction' }).click();
    await page.getByLabel('Trend file').setInputFiles({
      name: 'letter.csv',
      mimeType: 'text/csv',
      buffer: Buffer.from('Dear all,\nsee the attachment\n'),
    });
    await page.getByText('No column of times and values could be found').waitFor();
    await context.close();
  });

  test('sees only the valves of their own areas', async () => {
    const { page, context } = await openPage(browser, inject('url'));
    await signIn(page, 'operator@tailrace.example', password);
    await page.getByText('FV-1104').first().waitFor();
    expect(await page.locator('main').innerText()).not.toContain('FV-3301');
    await page.goto('/valves/FV-3301');
    await page
      .getByText(/not found|does not exist/i)
      .first()
      .waitFor();
    await context.close();
  });
});
