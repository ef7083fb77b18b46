import AxeBuilder from '@axe-core/playwright';
import { type Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { openBrowser, openPage, signIn } from './browser';

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

const asEngineer = async (options?: Parameters<typeof openPage>[2]) => {
  const opened = await openPage(browser, inject('url'), options);
  await signIn(opened.page, 'engineer@tailrace.example', 'tailrace-demo');
  return opened;
};

describe('an engineer', () => {
  test('finds the neediest valve first and, opened, the evidence for it with the caution', async () => {
    const { page, context, errors } = await asEngineer();
    const first = page.getByRole('link', { name: 'FV-1104' });
    await first.waitFor();
    const ranking = await page.locator('main').innerText();
    expect(ranking.indexOf('FV-1104')).toBeLessThan(ranking.indexOf('FV-3301'));
    expect(ranking).toMatch(/Undersized: \d+\s%/);
    await first.click();
    await page.getByText('Effective characteristic').waitFor();
    const sheet = await page.locator('main').innerText();
    expect(sheet).toContain('As specified');
    expect(sheet).toContain('As found');
    expect(sheet).toContain('Inferred from operating history');
    expect(errors).toEqual([]);
    await context.close();
  });

  test('keeps the filters of the ranking in the address, through a reload', async () => {
    const { page, context } = await asEngineer();
    await page.getByLabel('Finding').click();
    await page.getByRole('option', { name: 'Sticking' }).click();
    await page.waitForURL(/Sticking/);
    await page.reload();
    await page.getByRole('link', { name: 'FV-2201' }).waitFor();
    expect(await page.locator('main').innerText()).not.toContain('FV-1104');
    await context.close();
  });

  test('reads the trip valve in a list of its own and never in the ranking', async () => {
    const { page, context } = await asEngineer();
    await page.getByRole('link', { name: 'FV-1104' }).waitFor();
    expect(await page.locator('main').innerText()).not.toContain('FV-3306');
    await page.getByText(/^Trip valves/).click();
    await page.getByRole('link', { name: 'FV-3306' }).waitFor();
    await context.close();
  });

  test('finds a valve from anywhere by a part of its service', async () => {
    const { page, context } = await asEngineer();
    await page.goto('/runs');
    await page.getByPlaceholder('Find a valve by tag or service').fill('drum');
    await page.getByText('Wash water to drum 1').first().click();
    await page.waitForURL('**/valves/FV-1101');
    await context.close();
  });

  test('starts a run and sees it through to the outcome of each valve', async () => {
    const { page, context, errors } = await asEngineer();
    await page.goto('/runs');
    await page.getByRole('button', { name: 'Start a run' }).click();
    await page.getByRole('button', { name: 'Start', exact: true }).click();
    await page.waitForURL(/\/runs\/[0-9a-f-]{36}/);
    await page.getByText('done', { exact: true }).first().waitFor({ timeout: 90_000 });
    expect(await page.locator('main').innerText()).toContain('FV-4407');
    expect(errors).toEqual([]);
    await context.close();
  });

  test.each([
    ['the ranking', '/'],
    ['a valve', '/valves/FV-1105'],
    ['the register', '/valves'],
    ['the trends', '/trends'],
    ['the runs', '/runs'],
  ])('finds %s free of faults that shut readers out, light and dark', async (_, path) => {
    for (const dark of [false, true]) {
      const { page, context } = await asEngineer({ dark });
      await page.goto(path);
      await page.getByRole('heading').first().waitFor();
      await page.waitForLoadState('networkidle');
      const { violations } = await new AxeBuilder({ page }).withTags(['wcag2a', 'wcag2aa']).analyze();
      expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html}`)).toEqual([]);
      await context.close();
    }
  });

  test('can use every page on a phone without scrolling sideways', async () => {
    const { page, context } = await asEngineer({ width: 390, height: 844 });
    for (const path of ['/', '/valves/FV-2201', '/trends', '/trends/new', '/runs']) {
      await page.goto(path);
      await page.waitForLoadState('networkidle');
      expect(await page.evaluate(() => document.documentElement.scrollWidth), path).toBeLessThanOrEqual(390);
    }
    await context.close();
  });
});
