import { readFileSync } from 'node:fs';
import { strFromU8, unzipSync } from 'fflate';
import type { Download, Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { hasBrowser, signInAs } from '../support/browser/browser';
import { seen } from '../support/browser/page-state';
import { useProduct } from '../support/browser/use-product';

// Files out of the product and into it, in Debian's Chromium against the built product.
describe.skipIf(!hasBrowser())('exports and preset files', () => {
  const { visit } = useProduct();
  async function openDownload(page: Page, address: string): Promise<void> {
    await page.goto(address);
    await page.getByRole('region', { name: 'Reading' }).waitFor();
    await page.getByRole('button', { name: 'More actions' }).click();
    await page.getByRole('menuitem', { name: 'Download …' }).click();
  }
  const bytesOf = async (download: Download): Promise<Buffer> => readFileSync(await download.path());
  const chooseFile = (page: Page, buffer: Buffer): Promise<void> =>
    page
      .getByLabel('Choose a file')
      .first()
      .setInputFiles({ name: 'presets.json', mimeType: 'application/json', buffer });
  async function openImport(page: Page, buffer: Buffer): Promise<void> {
    await page.getByRole('button', { name: 'Import presets' }).click();
    await chooseFile(page, buffer);
  }

  it('an educator downloads a ZIP from the editor and finds it under Exports', async () => {
    const page = await visit();
    await signInAs(page, 'educator');
    await openDownload(page, '/strips/av-sequential-pacing');
    const dialog = page.getByRole('dialog');
    for (const name of [/^PNG/, /^PDF/, /^EDF/, /^WAV/]) await dialog.getByRole('checkbox', { name }).check();
    await seen(page, 'never connect to a person');
    const coming = page.waitForEvent('download');
    await dialog.getByRole('button', { name: 'Download', exact: true }).click();
    const download = await coming;
    expect(download.suggestedFilename()).toBe('av-sequential-pacing.zip');
    const files = unzipSync(await bytesOf(download));
    expect(Object.keys(files)).toEqual(
      expect.arrayContaining(['strip.csv', 'strip.png', 'strip.pdf', 'strip.edf', 'manifest.json']),
    );
    await dialog.getByText('is in your downloads').waitFor();
    await dialog.getByRole('link', { name: 'Exports' }).click();
    const row = page.getByRole('listitem').filter({ hasText: 'AV sequential pacing' });
    await row.getByText('WAV: For isolated, attenuated simulator inputs only').waitFor();
    const again = page.waitForEvent('download');
    await row.getByRole('link', { name: /^Download/ }).click();
    expect((await bytesOf(await again)).equals(await bytesOf(download))).toBe(true);
    await row.getByRole('button', { name: /^Delete/ }).click();
    await page.getByRole('dialog').getByRole('button', { name: 'Delete' }).click();
    await seen(page, 'No exports yet');
  });

  it('an unsaved draft is exported as it stands, by keyboard alone', async () => {
    const page = await visit();
    await signInAs(page, 'educator');
    await page.goto('/strips/new');
    const field = page.getByRole('textbox', { name: 'Atrial rate', exact: true });
    await field.fill('93');
    await field.press('Enter');
    await page.getByRole('button', { name: 'More actions' }).focus();
    await page.keyboard.press('Enter');
    // The first entry of the menu.
    await page.keyboard.press('Enter');
    const json = page.getByRole('checkbox', { name: /^JSON/ });
    for (let step = 0; step < 20; step++) {
      if (await json.evaluate((element) => element === document.activeElement)) break;
      await page.keyboard.press('Tab');
    }
    await page.keyboard.press('Space');
    const coming = page.waitForEvent('download');
    const start = page.getByRole('dialog').getByRole('button', { name: 'Download', exact: true });
    for (let step = 0; step < 40; step++) {
      if (await start.evaluate((element) => element === document.activeElement)) break;
      await page.keyboard.press('Tab');
    }
    await page.keyboard.press('Enter');
    const files = unzipSync(await bytesOf(await coming));
    const strip = JSON.parse(strFromU8(files['strip.json'])) as {
      parameters: { patient: { atrialRateBpm: number } };
    };
    expect(strip.parameters.patient.atrialRateBpm).toBe(93);
    await seen(page, 'is in your downloads');
    await page.keyboard.press('Escape');
    await page.getByRole('dialog').waitFor({ state: 'detached' });
  });

  it('a technician follows a long export, is told when it is too long, and may stop it', async () => {
    const page = await visit();
    await signInAs(page, 'technician');
    await openDownload(page, '/strips/ventricular-pacing-apex');
    const dialog = page.getByRole('dialog');
    const length = dialog.getByRole('textbox', { name: 'Length', exact: true });
    await length.fill('2 h');
    await length.press('Enter');
    await dialog.getByText('7200 s is above 3600 s, the most allowed.').waitFor();
    await dialog.getByRole('checkbox', { name: /^SVG/ }).check();
    await length.fill('30 min');
    await length.press('Enter');
    await dialog.getByRole('button', { name: 'Download', exact: true }).click();
    await dialog.getByText('at most 300 s for svg').waitFor();
    await dialog.getByRole('checkbox', { name: /^SVG/ }).uncheck();
    await dialog.getByRole('checkbox', { name: /^EDF/ }).check();
    await dialog.getByRole('button', { name: 'Download', exact: true }).click();
    await dialog.getByRole('progressbar').waitFor();
    await dialog.getByRole('button', { name: 'Go on meanwhile' }).click();
    await page.getByRole('link', { name: 'Exports', exact: true }).click();
    const row = page.getByRole('listitem').filter({ hasText: '30 min at 500/s' });
    const bar = row.getByRole('progressbar');
    await expect.poll(async () => Number(await bar.getAttribute('aria-valuenow'))).toBeGreaterThan(0);
    await row.getByRole('button', { name: /^Cancel/ }).click();
    await row.getByText('Cancelled').waitFor();
    await row.getByRole('button', { name: /again$/ }).click();
    await row.getByText('Kept until').waitFor({ timeout: 120_000 });
  });

  it('a preset file comes in twice, and is asked about: skip, keep both, replace', async () => {
    const page = await visit();
    await signInAs(page, 'educator');
    // A strip saved as a file from its menu …
    await page.goto('/strips?search=unipolar+system');
    const coming = page.waitForEvent('download');
    await page.getByRole('button', { name: 'Actions for The old unipolar system' }).click();
    await page.getByRole('menuitem', { name: 'Save as preset file' }).click();
    const download = await coming;
    expect(download.suggestedFilename()).toBe('paceloom-presets.json');
    const file = await bytesOf(download);
    // … is known when it comes back, and nothing would change.
    await openImport(page, file);
    const dialog = page.getByRole('dialog');
    await dialog.getByText('Here already, the same (yours)').waitFor();
    await dialog.getByText('Nothing would change.').waitFor();
    expect(await dialog.getByRole('button', { name: 'Import', exact: true }).isDisabled()).toBe(true);
    await dialog.getByRole('button', { name: 'Cancel' }).click();
    // Keep both: a second one stands beside it.
    await openImport(page, file);
    await dialog.getByRole('radio', { name: 'Keep both' }).click();
    await dialog.getByText('This adds 1 strip of your own.').waitFor();
    await dialog.getByRole('button', { name: 'Import', exact: true }).click();
    await page.getByText('Presets imported: 1 added').first().waitFor();
    await page.getByText('2 strips', { exact: true }).waitFor();
    // Replace: the file's content takes the place of an edit.
    const edited = JSON.parse(file.toString()) as { strips: { teachingPoint: string }[] };
    edited.strips[0].teachingPoint = 'Read the spike against the scale.';
    await openImport(page, Buffer.from(JSON.stringify(edited)));
    await dialog.getByText('Here with other content (yours)').waitFor();
    await dialog.getByRole('radio', { name: 'Replace' }).click();
    await dialog.getByText('This replaces 1.').waitFor();
    await dialog.getByRole('button', { name: 'Import', exact: true }).click();
    await page.getByText('Presets imported: 1 replaced').first().waitFor();
    await page.getByText('Read the spike against the scale.').waitFor();
    await page.getByText('2 strips', { exact: true }).waitFor();
    await page.getByRole('button', { name: 'Open it' }).last().click();
    await page.waitForURL('**/strips/tarn-valley-unipolar-ward-story');
  });

  it('an older file is brought up to date, a newer one and a wrong one are refused in words', async () => {
    const page = await visit();
    await signInAs(page, 'technician');
    await page.goto('/strips');
    await openImport(page, readFileSync('tests/fixtures/preset-file-1.json'));
    const dialog = page.getByRole('dialog');
    await dialog.getByText('An older file, brought up to date.').waitFor();
    await dialog.getByRole('button', { name: 'Import', exact: true }).click();
    await page.getByText('Presets imported: 3 added').first().waitFor();
    await openImport(page, Buffer.from('{"format":"paceloom-presets","fileVersion":9,"strips":[]}'));
    await dialog.getByText('This file was written by a newer version of the product').waitFor();
    await dialog.getByRole('button', { name: 'Choose another file' }).click();
    await chooseFile(page, Buffer.from('hello'));
    await dialog.getByText('Allowed: a preset file: JSON in UTF-8.').waitFor();
    await dialog.getByRole('button', { name: 'Cancel' }).click();
    const coming = page.waitForEvent('download');
    await page.getByRole('button', { name: /^Save all \d+ as a preset file$/ }).click();
    const all = JSON.parse((await bytesOf(await coming)).toString()) as { strips: unknown[] };
    expect(all.strips.length).toBeGreaterThan(80);
  });
});
