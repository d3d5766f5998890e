import { readFileSync } from 'node:fs';
import { unzipSync } from 'fflate';
import type { Download, Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { hasBrowser, signInAs } from '../support/browser/browser';
import { useProduct } from '../support/browser/use-product';

// Printed sheets, from the strip to the files, in Debian's Chromium against the built product.
describe.skipIf(!hasBrowser())('sheets in the browser', () => {
  const { visit: visitAsNobody, unwatchedVisit } = useProduct();

  async function visit(size?: { width: number; height: number }): Promise<Page> {
    const page = await visitAsNobody(size);
    await signInAs(page, 'educator');
    return page;
  }
  const sheet = (search = ''): string => `/strips/av-sequential-pacing/sheet${search}`;
  const paper = (page: Page) => page.getByRole('region', { name: 'Page', exact: true }).getByRole('img');
  const thumbnails = (page: Page) => page.getByRole('navigation', { name: 'Pages' }).getByRole('listitem');
  const desk = (page: Page, words: string | RegExp) =>
    page.getByRole('region', { name: 'Page', exact: true }).getByText(words).waitFor();
  const choose = async (page: Page, label: string, option: string): Promise<void> => {
    await page.getByRole('combobox', { name: label, exact: true }).click();
    await page.getByRole('option', { name: option, exact: true }).click();
  };
  async function fileOf(page: Page, act: () => Promise<void>): Promise<{ name: string; bytes: Uint8Array }> {
    const waiting: Promise<Download> = page.waitForEvent('download');
    await act();
    const download = await waiting;
    return { name: download.suggestedFilename(), bytes: new Uint8Array(readFileSync(await download.path())) };
  }
  /** What the browser would print: texts and paths of every sheet. */
  async function printed(page: Page): Promise<{ texts: string[]; paths: string[]; widthMm: string }[]> {
    return page.evaluate(() => {
      window.dispatchEvent(new Event('beforeprint'));
      const sheets = [...document.querySelectorAll('.print-pages svg')].map((svg) => ({
        texts: [...svg.querySelectorAll('text')].map((text) => text.textContent ?? ''),
        paths: [...svg.querySelectorAll('path')].map((path) => path.getAttribute('d') ?? ''),
        widthMm: svg.getAttribute('width') ?? '',
      }));
      window.dispatchEvent(new Event('afterprint'));
      return sheets;
    });
  }
  /** How many pixels of the page on the desk differ from white. */
  async function ink(page: Page): Promise<number> {
    return paper(page).evaluate((canvas: HTMLCanvasElement) => {
      const copy = new OffscreenCanvas(canvas.width, canvas.height);
      const context = copy.getContext('2d', { willReadFrequently: true });
      context?.drawImage(canvas, 0, 0);
      const data = context?.getImageData(0, 0, canvas.width, canvas.height).data ?? [];
      let count = 0;
      for (let i = 0; i < data.length; i += 4) if (data[i] + data[i + 1] + data[i + 2] < 300) count++;
      return count;
    });
  }

  it('opens from the editor, follows the options at once, and hides the title on the question', async () => {
    const page = await visit();
    await page.goto('/strips/av-sequential-pacing');
    await page.getByRole('link', { name: 'Sheet', exact: true }).click();
    await page.waitForURL(/\/strips\/av-sequential-pacing\/sheet$/u);
    await page.getByRole('heading', { name: 'Sheet AV sequential pacing' }).waitFor();
    await paper(page).waitFor();
    expect(await thumbnails(page).count()).toBe(2);
    await desk(page, /^A4 landscape at \d+ %\. On paper 1 mm is 1 mm: print at actual size\. 2 pages\.$/u);
    const before = await ink(page);
    await page.getByRole('radio', { name: '12 × 1' }).click();
    await expect.poll(() => ink(page)).toBeGreaterThan(before * 1.5);
    const sheets = await printed(page);
    const [question, answer] = [sheets[0], sheets[sheets.length - 1]];
    expect(question.texts.join(' ')).not.toMatch(/sequential|Atria|captures/u);
    expect(question.texts).toContain('aVF');
    expect(answer.texts.join(' ')).toContain('AV sequential pacing');
    await choose(page, 'Sheets', 'Answer only');
    await expect.poll(() => thumbnails(page).count()).toBeLessThan(sheets.length);
    await page.getByRole('radio', { name: 'Letter' }).click();
    await page.getByRole('radio', { name: 'Portrait' }).click();
    await desk(page, /^Letter portrait at/u);
    await page.getByRole('checkbox', { name: 'Ladder' }).uncheck();
    await expect.poll(async () => (await printed(page))[0].texts.join(' ')).not.toContain('Ventricles');
  });

  it('makes PDF, SVG, PNG and archives of the very pages that are shown', async () => {
    const page = await visit();
    await page.goto(sheet('?layout=3x4%2B1'));
    await paper(page).waitFor();
    const pdf = await fileOf(page, () => page.getByRole('button', { name: 'PDF' }).click());
    expect(pdf.name).toBe('question-and-answer-sheets.pdf');
    expect(Buffer.from(pdf.bytes.subarray(0, 5)).toString()).toBe('%PDF-');
    await page.getByText('Saved as question-and-answer-sheets.pdf').first().waitFor();
    await page.getByRole('button', { name: /Strip 1: answer/u }).click();
    const fromMenu = (menu: string, item: RegExp) => async (): Promise<void> => {
      await page.getByRole('button', { name: menu }).click();
      await page.getByRole('menuitem', { name: item }).click();
    };
    const svg = await fileOf(page, fromMenu('SVG files', /^This page/u));
    expect(svg.name).toBe('question-and-answer-sheets-page-2.svg');
    const shown = (await printed(page))[1];
    const text = Buffer.from(svg.bytes).toString('utf8');
    // The file carries its fonts in a style, which the policy of the page that parses it here does not allow.
    const withoutFonts = text.replace(/<style>@font-face[^<]*<\/style>/u, '');
    expect(withoutFonts).not.toBe(text);
    const file = await page.evaluate((svgText) => {
      const parsed = new DOMParser().parseFromString(svgText, 'image/svg+xml');
      return {
        texts: [...parsed.querySelectorAll('text')].map((one) => one.textContent ?? ''),
        paths: [...parsed.querySelectorAll('path')].map((path) => path.getAttribute('d') ?? ''),
        widthMm: parsed.documentElement.getAttribute('width') ?? '',
      };
    }, withoutFonts);
    expect(file).toEqual(shown);
    expect(file.widthMm).toBe('297mm');
    const png = await fileOf(page, fromMenu('PNG files', /600 dpi/u));
    expect(png.name).toBe('question-and-answer-sheets-page-2.png');
    // PNG (ISO/IEC 15948): the width stands at byte 16; 297 mm at 600 dots per inch are 7016.
    expect(new DataView(png.bytes.buffer, png.bytes.byteOffset).getUint32(16)).toBe(7016);
    const all = await fileOf(page, fromMenu('PNG files', /All 2 pages/u));
    expect(Object.keys(unzipSync(all.bytes))).toEqual(['page-1.png', 'page-2.png']);
  });

  it('prints every sheet on a page of its size', async () => {
    const page = await visit();
    await page.goto(sheet('?paper=letter&orientation=portrait'));
    await paper(page).waitFor();
    const pdf = Buffer.from(await page.pdf({ preferCSSPageSize: true })).toString('latin1');
    const boxes = [...pdf.matchAll(/\/MediaBox \[0 0 ([\d.]+) ([\d.]+)\]/gu)];
    expect(boxes).toHaveLength(2);
    // ANSI/ASME Y14.1: 8.5 × 11 in are 612 × 792 points; the browser rounds to its pixels (0.75 points).
    for (const [, width, height] of boxes) {
      expect(Math.abs(Number(width) - 612)).toBeLessThanOrEqual(0.75);
      expect(Math.abs(Number(height) - 792)).toBeLessThanOrEqual(0.75);
    }
    // Nothing of the page around the sheets is left when printing is over.
    expect(await page.locator('.print-pages').count()).toBe(0);
  });

  it('puts several strips on pages, in any order, and keeps all of it through a reload and Back', async () => {
    const page = await visit();
    await page.goto(sheet('?layout=single&leads=II&sheets=question'));
    await paper(page).waitFor();
    await page.getByRole('button', { name: 'Add a strip' }).click();
    await page.getByLabel('Search the library').fill('junctional escape');
    await page
      .getByRole('list', { name: 'Strips found' })
      .getByText('Capture lost, junctional escape')
      .click();
    await page.getByRole('heading', { name: 'Sheet AV sequential pacing and 1 more' }).waitFor();
    await page.getByText('Strips 1 and 2: question').waitFor();
    await page.getByLabel('Cohort').fill('Autumn B');
    await page.waitForURL(/cohort=Autumn/u);
    await page.getByRole('button', { name: 'Up: Capture lost, junctional escape' }).click();
    await page.waitForURL(/\/strips\/capture-lost-junctional-escape\/sheet\?and=av-sequential-pacing/u);
    await page.reload();
    await page.getByRole('heading', { name: 'Sheet Capture lost, junctional escape and 1 more' }).waitFor();
    await page.getByText('Strips 1 and 2: question').waitFor();
    expect(await page.getByLabel('Cohort').inputValue()).toBe('Autumn B');
    expect((await printed(page))[0].texts.join(' ')).toContain('cohort Autumn B');
    await page.goBack();
    await page.getByRole('heading', { name: 'Sheet AV sequential pacing and 1 more' }).waitFor();
    await page.getByRole('button', { name: 'Take off: Capture lost, junctional escape' }).click();
    await page.getByRole('heading', { name: 'Sheet AV sequential pacing', exact: true }).waitFor();
    expect(await page.getByLabel('Cohort').inputValue()).toBe('Autumn B');
  });

  it('says that unsaved changes are not on the sheet', async () => {
    const page = await visit();
    await page.goto('/strips/av-sequential-pacing');
    const rate = page.getByRole('textbox', { name: 'Atrial rate', exact: true });
    await rate.fill('50');
    await rate.press('Enter');
    await page.getByRole('link', { name: 'Sheet as saved' }).click();
    await page.getByRole('button', { name: 'Leave' }).click();
    await page.getByText('The sheet shows the strip as saved.').waitFor();
    await page.getByText('“AV sequential pacing” has changes in this tab that are not saved.').waitFor();
  });

  it('copies the picture of the page, and saves it where the browser refuses', async () => {
    const page = await visit();
    await page.context().grantPermissions(['clipboard-read', 'clipboard-write']);
    await page.goto(sheet());
    await paper(page).waitFor();
    await page.getByRole('button', { name: 'Copy picture' }).click();
    await page.getByText('Picture of this page copied').first().waitFor();
    const size = await page.evaluate(async () => {
      const [item] = await navigator.clipboard.read();
      const picture = await createImageBitmap(await item.getType('image/png'));
      return [picture.width, picture.height];
    });
    // A4 at 8 pixels a millimetre.
    expect(size).toEqual([2376, 1680]);
    await page.evaluate(() => {
      navigator.clipboard.write = () => Promise.reject(new Error('refused'));
    });
    const { name } = await fileOf(page, () => page.getByRole('button', { name: 'Copy picture' }).click());
    expect(name).toBe('question-and-answer-sheets-page-1.png');
    await page.getByText('This browser does not let a page copy pictures.').first().waitFor();
  });

  it('says what is wrong: a strip that is gone, one too long, a server that is away', async () => {
    // The router logs what it caught; that one visit is not watched.
    const lost = await unwatchedVisit();
    await signInAs(lost, 'educator');
    await lost.goto('/strips/no-such-strip/sheet');
    await lost.getByText('There is nothing here').waitFor();
    const page = await visit();
    await page.goto(sheet('?and=no-such-strip'));
    await page.getByText('A strip of these sheets is not there.').waitFor();
    await page.getByRole('button', { name: 'Take it off' }).click();
    await page.getByText('A strip of these sheets is not there.').waitFor({ state: 'detached' });
    const long = await page.evaluate(async () => {
      const response = await fetch('/api/strips', {
        method: 'POST',
        headers: { 'Content-Type': 'application/json' },
        body: JSON.stringify({ title: 'Ten minutes', parameters: { durationS: 600 } }),
      });
      return ((await response.json()) as { strip: { id: string } }).strip.id;
    });
    await page.goto(`/strips/${long}/sheet`);
    await page.getByText('“Ten minutes” lasts 600 s; sheets draw strips of at most 300 s.').waitFor();
    expect(await page.getByRole('button', { name: 'PDF' }).isDisabled()).toBe(true);
    await page.goto(sheet());
    await paper(page).waitFor();
    await page.context().setOffline(true);
    await page.getByRole('button', { name: 'PDF' }).click();
    await page.getByText('The file could not be made. The server cannot be reached.').first().waitFor();
    await page.context().setOffline(false);
  });

  /** As long as a finger takes; the radio group chooses what was reached with a key held down. */
  const heldMs = 60;

  it('works by keyboard alone', async () => {
    const page = await visit();
    await page.goto(sheet());
    await paper(page).waitFor();
    const focused = () => page.evaluate(() => document.activeElement?.textContent ?? '');
    const tabTo = async (words: RegExp): Promise<void> => {
      for (let step = 0; step < 40; step++) {
        await page.keyboard.press('Tab');
        if (words.test(await focused())) return;
      }
      throw new Error(`Tab does not reach ${words.source}`);
    };
    await tabTo(/Strip 1: answer/u);
    await page.keyboard.press('Enter');
    await page.waitForURL(/page=2/u);
    await tabTo(/^Whole page$/u);
    await page.keyboard.press('ArrowRight', { delay: heldMs });
    await desk(page, /at 132 %/u);
    await tabTo(/^Chosen$/u);
    await page.keyboard.press('ArrowRight', { delay: heldMs });
    await page.waitForURL(/layout=single/u);
    await page.getByRole('button', { name: 'Add a strip' }).focus();
    await page.keyboard.press('Enter');
    await page.keyboard.type('asystole');
    await page.getByRole('list', { name: 'Strips found' }).getByText('Spikes over asystole').waitFor();
    await page.keyboard.press('Escape');
    await expect.poll(focused).toBe('Add a strip');
  });

  it('has its options in a drawer on a phone', async () => {
    const page = await visit({ width: 390, height: 844 });
    await page.goto(sheet());
    await paper(page).waitFor();
    await page.getByRole('button', { name: 'Options' }).click();
    const drawer = page.getByRole('dialog', { name: 'Options' });
    await drawer.getByRole('radio', { name: 'Portrait' }).click();
    await drawer.getByRole('button', { name: 'Done' }).click();
    await desk(page, /^A4 portrait at/u);
  });
});
