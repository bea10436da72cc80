import { mkdtempSync, readFileSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Page } from 'playwright-core';
import { describe, expect, test } from 'vitest';
import { openPage } from '../support/open-page';

const verdict = (page: Page) => page.locator('.verdict');
const row = (page: Page, seat: string) => page.locator(`.seats tr[data-seat="${seat}"]`);
const room = (page: Page) => page.locator('.room [data-renderer]');

/** Opens the page and waits for the worked venue's prediction and its drawing. */
async function openVenue(options: Parameters<typeof openPage>[0] = {}) {
  const opened = await openPage(options);
  await verdict(opened.page).getByText('serves').waitFor();
  await room(opened.page).waitFor();
  return opened;
}

const sentence = (page: Page) => page.locator('.verdict-sentence').innerText();
const margins = (page: Page) =>
  page.locator('.seats tr[data-seat]').evaluateAll((rows) => rows.map((r) => r.textContent));

/** Chooses an item of the list by its id. */
async function choose(page: Page, id: string) {
  await page.getByPlaceholder('Find in this layout').fill(id);
  await page
    .locator('.item')
    .getByRole('row', { name: new RegExp(`^${id}\\b`) })
    .first()
    .click();
  await page.getByPlaceholder('Find in this layout').fill('');
  await page.locator('.item').getByRole('heading', { name: id }).waitFor();
}

describe('the main job', () => {
  test('opens the first venue already predicted, in the view, the table and one sentence', async () => {
    const { page } = await openVenue();
    expect(await sentence(page)).toMatch(
      /^Kept 6 dB below ringing at 250 Hz, scheme A serves 78 of 78 seats; the worst, \S+, has/,
    );
    expect(await page.locator('.verdict-peak').innerText()).toContain('covered');
    expect(await room(page).getAttribute('data-seats-short')).toBe('0');
    expect(await row(page, 'S5').count()).toBe(1);
  });

  test('joins the selection of the table and the view, both ways', async () => {
    const { page } = await openVenue();
    await row(page, 'P-2-1').click();
    await expect.poll(() => room(page).getAttribute('data-selected')).toBe('seat:P-2-1');
    await expect.poll(async () => Number(await room(page).getAttribute('data-seat-x'))).toBeGreaterThan(0);
    const x = Number(await room(page).getAttribute('data-seat-x'));
    const y = Number(await room(page).getAttribute('data-seat-y'));
    await row(page, 'S4').click();
    await expect.poll(() => room(page).getAttribute('data-selected')).toBe('seat:S4');
    await room(page).click({ position: { x, y } });
    await expect.poll(() => room(page).getAttribute('data-selected')).toBe('seat:P-2-1');
    expect(await row(page, 'P-2-1').getAttribute('aria-selected')).toBe('true');
  });

  test('swaps a microphone pattern by keyboard alone and shows what that did', async () => {
    const { page } = await openVenue();
    const before = { sentence: await sentence(page), margins: await margins(page) };
    await page.keyboard.press('Control+k');
    await page.keyboard.type('wall boxes');
    await page.keyboard.press('Enter');
    await expect.poll(() => sentence(page)).toContain('scheme C serves 34 of 78');
    await page.keyboard.press('Alt+1');
    await expect.poll(() => sentence(page)).toBe(before.sentence);

    await page.getByPlaceholder('Find in this layout').focus();
    await page.keyboard.type('m-s6');
    await page.keyboard.press('ArrowDown');
    for (let presses = 0; presses < 6; presses++) {
      if ((await room(page).getAttribute('data-selected')) === 'microphone:m-s6') break;
      await page.keyboard.press(presses === 0 ? 'ArrowDown' : 'Enter');
    }
    await expect.poll(() => room(page).getAttribute('data-selected')).toBe('microphone:m-s6');
    const model = page.locator('.item').getByRole('combobox', { name: 'Model' });
    for (
      let presses = 0;
      presses < 60 && !(await model.evaluate((field) => field === document.activeElement));
      presses++
    ) {
      await page.keyboard.press('Tab');
    }
    await page.keyboard.type('Omni');
    await page.keyboard.press('ArrowDown');
    await page.keyboard.press('Enter');
    await expect.poll(() => sentence(page)).not.toBe(before.sentence);
    await expect.poll(() => room(page).getAttribute('data-seats-short')).not.toBe('0');
    await expect.poll(() => margins(page)).not.toEqual(before.margins);

    await page.keyboard.press('Escape');
    await page.keyboard.press('Control+z');
    await expect.poll(() => sentence(page)).toBe(before.sentence);
    await expect.poll(() => margins(page)).toEqual(before.margins);
  });

  test('takes a typed aim, says what it meets, and takes it back', async () => {
    const { page } = await openVenue();
    await page.keyboard.press('Alt+3');
    await expect.poll(() => sentence(page)).toContain('scheme C');
    const before = await sentence(page);
    await choose(page, 'w1');
    const pan = page.locator('.item').getByRole('spinbutton', { name: 'Turn pan' });
    const aimed = await page.locator('.item').innerText();
    await pan.fill('-150');
    await pan.press('Enter');
    await expect.poll(() => page.locator('.item').innerText()).not.toBe(aimed);
    expect(await pan.inputValue()).toBe('−150.0');
    await expect.poll(() => sentence(page)).not.toBe(before);
    await page.getByRole('button', { name: /^Undo: / }).click();
    await expect.poll(() => sentence(page)).toBe(before);
    expect(await page.locator('.item').innerText()).toBe(aimed);
    await page.getByRole('button', { name: /^Redo: / }).click();
    await expect.poll(() => sentence(page)).not.toBe(before);
  });

  test('recalculates while a number is being typed, and Escape takes it back', async () => {
    const { page } = await openVenue();
    const before = await sentence(page);
    await choose(page, 'm-s6');
    const z = page.locator('.item').getByRole('spinbutton', { name: 'Place z' });
    await z.fill('2.9');
    await expect.poll(() => sentence(page)).not.toBe(before);
    await z.press('Escape');
    await expect.poll(() => sentence(page)).toBe(before);
    expect(await page.getByRole('button', { name: 'Undo', exact: true }).isDisabled()).toBe(true);
  });
});

describe('files', () => {
  /** A browser without the save picker: files come as downloads, which a test can read. */
  const withoutPickers = (page: Page) =>
    page.addInitScript(() => {
      Reflect.deleteProperty(window, 'showSaveFilePicker');
      Reflect.deleteProperty(window, 'showOpenFilePicker');
    });

  async function openFile(page: Page, path: string) {
    const chooser = page.waitForEvent('filechooser');
    await page.getByRole('button', { name: 'Open', exact: true }).click();
    await page.getByRole('menuitem', { name: 'A layout file…' }).click();
    await (await chooser).setFiles(path);
  }

  test('saves, reloads and opens again with the same numbers', async () => {
    const { page } = await openVenue();
    await withoutPickers(page);
    await page.reload();
    await verdict(page).getByText('serves').waitFor();
    const untouched = await margins(page);
    await choose(page, 'm-s6');
    const z = page.locator('.item').getByRole('spinbutton', { name: 'Place z' });
    await z.fill('1.31');
    await z.press('Enter');
    await expect.poll(() => verdict(page).getAttribute('data-stale')).toBe('false');
    await expect.poll(() => margins(page)).not.toEqual(untouched);
    const edited = { sentence: await sentence(page), margins: await margins(page) };

    const download = page.waitForEvent('download');
    await page.keyboard.press('Control+s');
    const path = await (await download).path();
    const folder = mkdtempSync(join(tmpdir(), 'gainwright-'));
    const saved = join(folder, 'edited.layout.json');
    writeFileSync(saved, readFileSync(path));

    await page.reload();
    await verdict(page).getByText('serves').waitFor();
    expect(await sentence(page)).not.toBe(edited.sentence);
    await openFile(page, saved);
    await expect.poll(() => sentence(page)).toBe(edited.sentence);
    await expect.poll(() => margins(page)).toEqual(edited.margins);
  });

  test('says what is wrong with a broken file and leaves the open layout as it was', async () => {
    const { page } = await openVenue();
    await withoutPickers(page);
    await page.reload();
    await verdict(page).getByText('serves').waitFor();
    const before = { sentence: await sentence(page), margins: await margins(page) };
    const folder = mkdtempSync(join(tmpdir(), 'gainwright-'));
    const layout = JSON.parse(readFileSync('data/layouts/meeting-room.layout.json', 'utf8'));
    layout.venue.faces[2].corners.length = 2;
    const broken = join(folder, 'broken.layout.json');
    writeFileSync(broken, JSON.stringify(layout));

    await openFile(page, broken);
    const notice = page.getByRole('alertdialog');
    await notice.waitFor();
    const said = await notice.innerText();
    expect(said).toContain('broken.layout.json was not opened');
    expect(said).toContain('venue.faces[2].corners: fewer than three corners');
    expect(said).toContain('left as it was');
    await page.keyboard.press('Escape');
    await notice.waitFor({ state: 'detached' });
    expect(await sentence(page)).toBe(before.sentence);
    expect(await margins(page)).toEqual(before.margins);
  });

  test('asks before opening over unsaved work', async () => {
    const { page } = await openVenue();
    await choose(page, 'm-s6');
    const z = page.locator('.item').getByRole('spinbutton', { name: 'Place z' });
    await z.fill('1.31');
    await z.press('Enter');
    await page.keyboard.press('Control+k');
    await page.keyboard.type('meeting room');
    await page.keyboard.press('Enter');
    const notice = page.getByRole('alertdialog');
    await notice.waitFor();
    await notice.getByRole('button', { name: 'Cancel' }).click();
    expect(await page.locator('.head-layout').innerText()).toContain('Saltmarsh');
  });
});

describe('the sheet', () => {
  test.each(['light', 'dark'] as const)('fits 1024 × 768 in %s without cutting anything off', async (theme) => {
    const { page } = await openVenue({ viewport: { width: 1024, height: 768 }, theme });
    expect(await page.locator('html').getAttribute('data-theme')).toBe(theme);
    const overflow = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
    expect(overflow).toBeLessThanOrEqual(0);
  });

  test('shows lengths in feet and inches', async () => {
    const { page } = await openVenue();
    await choose(page, 'c1');
    const z = page.locator('.item').getByRole('spinbutton', { name: 'Place z' });
    const metres = await z.inputValue();
    await page.getByRole('button', { name: 'feet and inches' }).click();
    await expect.poll(() => z.inputValue()).toMatch(/^\d+′ \d+[⅛¼⅜½⅝¾⅞]?″$/);
    await page.getByRole('button', { name: 'm', exact: true }).click();
    await expect.poll(() => z.inputValue()).toBe(metres);
  });

  test('draws the plan where there is no WebGL at all, and selects in it', async () => {
    const { page } = await openVenue({ disable3d: true, declared: [/WebGL/] });
    expect(await room(page).getAttribute('data-renderer')).toBe('drawing');
    await page.locator('.room [data-seat="P-2-1"]').first().click();
    await expect.poll(() => row(page, 'P-2-1').getAttribute('aria-selected')).toBe('true');
  });

  test('makes no frames when nothing moves', async () => {
    const { page } = await openVenue();
    await page.waitForTimeout(1500);
    const drawn = await page.evaluate(async () => {
      const canvas = document.querySelector('canvas');
      const context = canvas?.getContext('webgl2');
      if (!context) throw new Error('no WebGL context');
      let calls = 0;
      const original = context.drawElements.bind(context);
      context.drawElements = (...parameters: Parameters<typeof original>) => {
        calls++;
        original(...parameters);
      };
      await new Promise((resolve) => setTimeout(resolve, 1000));
      return calls;
    });
    expect(drawn).toBe(0);
  });
});
