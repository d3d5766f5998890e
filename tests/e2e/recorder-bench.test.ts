import { readFileSync } from 'node:fs';
import type { Download, Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { hasBrowser, signInAs } from '../support/browser/browser';
import { useProduct } from '../support/browser/use-product';

// The recorder bench in Debian's Chromium against the built product.
describe.skipIf(!hasBrowser())('the recorder bench', () => {
  const { visit } = useProduct();
  const standards = (page: Page) => page.getByRole('region', { name: 'Standards' });
  const lessons = (page: Page) => page.getByRole('region', { name: 'Lessons' });
  const setting = (page: Page, number: number) =>
    page.getByRole('group', { name: `Setting ${number}`, exact: true });
  const addressHas = (page: Page, part: string) => page.waitForURL((url) => url.search.includes(part));
  async function downloaded(page: Page, item: string): Promise<{ name: string; bytes: Buffer }> {
    await page.getByRole('button', { name: 'Download report' }).click();
    const waiting: Promise<Download> = page.waitForEvent('download');
    await page.getByRole('menuitem', { name: item }).click();
    const download = await waiting;
    return { name: download.suggestedFilename(), bytes: readFileSync(await download.path()) };
  }

  it('teaches a learner that a spike vanishes, with the figure of the list in the text, and keeps it on reload', async () => {
    const page = await visit();
    await signInAs(page, 'learner');
    await page.getByRole('link', { name: 'Recorder', exact: true }).click();
    const lesson = lessons(page).getByRole('button', { name: /spike vanishes/iu });
    await lesson.getByText(/\d\.\d\d mV/u).waitFor();
    const figure = /(\d\.\d\d) to (\d\.\d\d) mV/u.exec(await lesson.innerText());
    if (!figure) throw new Error('the list shows no figure');
    await lesson.click();
    await addressHas(page, 'lesson.');
    for (const value of figure.slice(1)) {
      await lessons(page).getByText(`${value} mV (`).waitFor();
    }
    // The spike's height in the table of measures is the same measurement.
    await page
      .getByRole('cell', { name: new RegExp(figure[2].replace('.', '\\.'), 'u') })
      .first()
      .waitFor();
    await page.reload();
    await lessons(page).getByText(`${figure[2]} mV (`).waitFor();
  });

  it('follows a setting in the table of standards, says what it is not meant for, and goes back', async () => {
    const page = await visit();
    await signInAs(page, 'technician');
    await page.goto('/recorder?source=preset.av-sequential-pacing&setting=monitor&setting=diagnostic');
    await standards(page).getByText('declares no diagnostic band').first().waitFor();
    expect(await standards(page).getByText('failed:').count()).toBe(0);
    await setting(page, 2).getByRole('combobox', { name: 'Setting 2: mains notch' }).click();
    await page.getByRole('option', { name: '50 Hz notch' }).click();
    await addressHas(page, 'diagnostic-notch50');
    await standards(page).getByText('failed:').first().waitFor({ state: 'attached' });
    await page.goBack();
    await page.waitForURL((url) => /setting=diagnostic(&|$)/u.test(url.search));
    await standards(page).getByText('failed:').first().waitFor({ state: 'detached' });
  });

  it('refuses limits out of range at their field and keeps the setting', async () => {
    const page = await visit();
    await signInAs(page, 'educator');
    await page.goto('/recorder?setting=monitor&setting=0.67to100');
    const low = setting(page, 2).getByRole('textbox').first();
    await low.fill('900');
    await low.press('Enter');
    await setting(page, 2).getByText(/10 Hz/u).first().waitFor();
    expect(new URL(page.url()).search).toContain('0.67to100');
  });

  it('downloads the dated report as CSV and PDF', async () => {
    const page = await visit();
    await signInAs(page, 'administrator');
    await page.goto('/recorder?setting=monitor&setting=diagnostic');
    await standards(page).getByText('declares no diagnostic band').first().waitFor();
    const csv = await downloaded(page, 'CSV, dated');
    expect(csv.name).toMatch(/^recorder-conformance-\d{4}-\d{2}-\d{2}\.csv$/u);
    const lines = csv.bytes.toString('utf8').split('\r\n');
    expect(lines[0]).toContain('requirement,applied,source');
    expect(lines.filter((line) => line.includes(',Monitor,')).length).toBe(
      lines.filter((line) => line.includes(',Diagnostic,')).length,
    );
    const pdf = await downloaded(page, 'PDF, dated');
    expect(pdf.name).toMatch(/\.pdf$/u);
    expect(pdf.bytes.subarray(0, 5).toString()).toBe('%PDF-');
  });

  it('marks stimuli on request, with hits and false marks of this strip', async () => {
    const page = await visit();
    await signInAs(page, 'educator');
    await page.goto('/recorder?source=preset.av-sequential-pacing');
    const marker = page.getByRole('region', { name: 'Stimulus marker' });
    await marker.getByText(/On this strip (\d+) of \1 stimuli are marked; no marker is false/u).waitFor();
    await marker.getByRole('radio', { name: 'On' }).click();
    await addressHas(page, 'marker=on');
  });

  it('can be used by keyboard alone: lesson, beat, view', async () => {
    const page = await visit();
    await signInAs(page, 'learner');
    await page.goto('/recorder');
    const lesson = lessons(page).getByRole('button').first();
    await lesson.focus();
    await page.keyboard.press('Enter');
    await addressHas(page, 'lesson.');
    const traces = page.getByLabel(/Arrow keys choose the beat/u);
    await traces.focus();
    await page.keyboard.press('ArrowRight');
    await addressHas(page, 'beat=');
    const before = new URL(page.url()).searchParams.get('beat');
    await page.keyboard.press('ArrowRight');
    await page.waitForURL((url) => url.searchParams.get('beat') !== before);
  });
});
