import { describe, expect, test } from 'vitest';
import { openPage } from '../support/open-page';

/** The worked venue, predicted, with the venue panel shown. */
async function openVenue() {
  const opened = await openPage();
  await opened.page.locator('.verdict').getByText('serves').waitFor();
  return opened;
}

describe('what the room does', () => {
  test('the venue panel shows decay, what absorbs, and voice and noise; its sentence leads to a face', async () => {
    const { page } = await openVenue();
    const chart = page.locator('.item').getByRole('img', { name: /^Decay by octave/ });
    await chart.waitFor();
    expect(await chart.getAttribute('aria-label')).toContain('500 0.6 s');
    const absorbers = await page.locator('.charts-absorption tbody tr').count();
    expect(absorbers).toBeGreaterThan(4);
    await page
      .locator('.item')
      .getByRole('img', { name: /^Voice and noise by octave/ })
      .waitFor();
    await page.locator('.charts-say button').click();
    await expect.poll(() => page.locator('.room-drawing').getAttribute('data-selected')).toMatch(/^face:/);
  });

  test('another finish on a face changes the decay, and undo brings it back', async () => {
    const { page } = await openVenue();
    const decay = page.locator('.item').getByRole('img', { name: /^Decay by octave/ });
    await decay.waitFor();
    const before = await decay.getAttribute('aria-label');
    await page.locator('.charts-say button').click();
    const finish = page.locator('.item').getByRole('combobox', { name: 'Finish' });
    await finish.fill('Carpet');
    await page.keyboard.press('ArrowDown');
    await page.keyboard.press('Enter');
    await page.getByRole('button', { name: /^Undo: / }).waitFor();
    await page.locator('.head-layout').click();
    await expect.poll(() => decay.getAttribute('aria-label')).not.toBe(before);
    await page.getByRole('button', { name: /^Undo: / }).click();
    await expect.poll(() => decay.getAttribute('aria-label')).toBe(before);
  });

  test('all proposed delays are adopted in one step', async () => {
    const { page } = await openVenue();
    await page.keyboard.press('Control+k');
    await page.keyboard.type('all proposed delays');
    await page.keyboard.press('Enter');
    await page.getByRole('button', { name: 'Undo: Use all proposed delays' }).waitFor();
    await page.getByRole('button', { name: 'Undo: Use all proposed delays' }).click();
    expect(await page.getByRole('button', { name: 'Undo', exact: true }).isDisabled()).toBe(true);
  });

  test('seats can be coloured by every quantity, each with its legend', async () => {
    const { page } = await openVenue();
    const legend = page.getByLabel('Legend');
    for (const quantity of [
      'level',
      'signal to noise',
      'speech transmission index',
      'direct to reverberant',
      'arrival gap',
    ]) {
      await page.keyboard.press('Control+k');
      await page.keyboard.type(`seats by ${quantity}`);
      await page.keyboard.press('Enter');
      await expect.poll(async () => (await legend.textContent())?.toLowerCase()).toContain(quantity);
    }
  });
});
