import { describe, expect, test } from 'vitest';
import { openPage } from '../support/open-page';

describe('the built page', () => {
  test('says who it is, keeps to its own files and gives no warning', async () => {
    const { page } = await openPage();
    expect(await page.title()).toBe('Gainwright');
    expect(await page.locator('html').getAttribute('lang')).toBe('en');
    const policy = await page.locator('meta[http-equiv="Content-Security-Policy"]').getAttribute('content');
    expect(policy).toContain("default-src 'self'");
    await page.locator('#app > *').first().waitFor();
  });

  test('may not run text as a program', async () => {
    const opened = await openPage();
    const outcome = await opened.page.evaluate(() => {
      const script = document.createElement('script');
      script.textContent = 'globalThis.injected = true';
      document.body.append(script);
      return 'injected' in globalThis;
    });
    expect(outcome).toBe(false);
    await expect(opened.close()).rejects.toThrow('Content Security Policy');
  });
});

describe('the test browser', () => {
  test('fails a page that warns', async () => {
    const opened = await openPage();
    await opened.page.evaluate(() => console.warn('made up'));
    expect(opened.assertQuiet).toThrow('warning: made up');
    await expect(opened.close()).rejects.toThrow('warning: made up');
  });

  test('fails a page that throws', async () => {
    const opened = await openPage();
    const thrown = opened.page.waitForEvent('pageerror');
    await opened.page.evaluate(() => {
      setTimeout(() => {
        throw new Error('made up');
      });
    });
    await thrown;
    await expect(opened.close()).rejects.toThrow('uncaught: Error: made up');
  });

  test.each([
    [false, true],
    [true, false],
  ])('with disable3d %s it has WebGL 2: %s', async (disable3d, expected) => {
    const { page } = await openPage({ disable3d });
    const found = await page.evaluate(() => document.createElement('canvas').getContext('webgl2') !== null);
    expect(found).toBe(expected);
  });
});
