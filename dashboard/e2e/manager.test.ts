import { type Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { openBrowser, openPage, signIn } from './browser';

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

const asManager = async () => {
  const opened = await openPage(browser, inject('url'));
  await signIn(opened.page, 'manager@tailrace.example', 'tailrace-demo');
  return opened;
};

describe('a manager', () => {
  test('reads in one sentence how the plant stands', async () => {
    const { page, context } = await asManager();
    await page.getByText(/25 valves in your areas/).waitFor();
    await context.close();
  });

  test('may read runs and trends, and is not offered to start or bring in any', async () => {
    const { page, context } = await asManager();
    for (const path of ['/runs', '/trends']) {
      await page.goto(path);
      await page.getByRole('table').first().waitFor();
      const offered = await page
        .getByRole('main')
        .getByText(/^(Start a run|Bring in a trend file)$/)
        .count();
      expect(offered, path).toBe(0);
    }
    await page.goto('/trends/new');
    await page
      .getByText(/role does not allow|not allowed/i)
      .first()
      .waitFor();
    await context.close();
  });

  test('stays signed in through a reload, and after signing out no page opens', async () => {
    const { page, context } = await asManager();
    await page.reload();
    await page.getByRole('link', { name: 'FV-1104' }).waitFor();
    await page.getByRole('button', { name: /Mira Tveit/ }).click();
    await page.getByRole('menuitem', { name: /Sign out/ }).click();
    await page.waitForURL('**/sign-in**');
    await page.goto('/valves/FV-1104');
    await page.waitForURL('**/sign-in**');
    await context.close();
  });

  test('opens a deep link straight away', async () => {
    const { page, context } = await asManager();
    await page.goto('/valves/FV-3301');
    await page.getByRole('heading', { name: /FV-3301/ }).waitFor();
    await context.close();
  });
});
