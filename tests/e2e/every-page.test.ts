import { readFileSync } from 'node:fs';
import AxeBuilder from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { hasBrowser, signInAs } from '../support/browser/browser';
import { exportStates } from '../support/browser/export-states';
import { seen, type PageState } from '../support/browser/page-state';
import { useProduct } from '../support/browser/use-product';

const sizes = [
  { width: 1440, height: 900 },
  { width: 1024, height: 768 },
  { width: 390, height: 844 },
];

const openGroup = (page: Page, name: string): Promise<void> =>
  page.getByRole('region', { name: 'Parameters' }).getByRole('button', { name }).click();

/** Every strip is drawn, so that files can be made, and the buttons have come to their colours. */
async function sheetReady(page: Page): Promise<void> {
  await page.locator('button:enabled', { hasText: /^Print/u }).waitFor();
  await page.evaluate(() => Promise.all(document.getAnimations().map(({ finished }) => finished)));
}

const states: PageState[] = [
  {
    name: 'library',
    path: '/strips',
    ready: (page) => page.getByRole('heading', { name: /Recognise the chamber/ }).waitFor(),
  },
  {
    name: 'library as a table',
    path: '/strips?view=table&sort=title',
    ready: (page) => seen(page, 'Changed'),
  },
  {
    name: 'library without a match',
    path: '/strips?search=zzzz',
    ready: (page) => seen(page, 'No strip fits'),
  },
  { name: 'new strip', path: '/strips/new', ready: (page) => seen(page, 'No stimulus is given.') },
  {
    name: 'saved strip',
    path: '/strips/av-sequential-pacing',
    ready: (page) => seen(page, 'stimulated in sequence'),
  },
  ...['Pacing', 'Leads and capture', 'Waveform', 'Disturbance', 'Recorder'].map((group): PageState => ({
    name: `group ${group}`,
    path: '/strips/two-ventricles-right-first',
    ready: (page) => seen(page, '40 ms apart'),
    act: (page) => openGroup(page, group),
  })),
  {
    name: 'fault, sensing windows and a chosen beat',
    path: '/strips/av-sequential-pacing',
    ready: (page) => seen(page, 'stimulated in sequence'),
    async act(page) {
      await page.getByRole('button', { name: 'Beat 5', exact: true }).click();
      await page.getByRole('button', { name: 'Sensing windows' }).click();
      await openGroup(page, 'Leads and capture');
      await page.getByRole('tab', { name: 'Faults' }).click();
      await page.getByRole('button', { name: 'Add a fault' }).click();
      await seen(page, 'a fault, with output enough');
    },
  },
  {
    name: 'chest pads',
    path: '/strips/new',
    ready: (page) => seen(page, 'No stimulus is given.'),
    async act(page) {
      await openGroup(page, 'Pacing');
      await page.getByRole('combobox', { name: 'Pacing', exact: true }).click();
      await page.getByRole('option', { name: 'Transcutaneous' }).click();
      await openGroup(page, 'Leads and capture');
      await seen(page, 'Size of the stimulus on the trace');
    },
  },
  {
    name: 'twelve leads with an error at a field',
    path: '/strips/new',
    ready: (page) => seen(page, 'No stimulus is given.'),
    async act(page) {
      await page.getByRole('radio', { name: 'All twelve' }).click();
      const field = page.getByRole('textbox', { name: 'Atrial rate', exact: true });
      await field.fill('9000');
      await field.press('Enter');
      await seen(page, 'the most allowed');
    },
  },
  {
    name: 'save dialog',
    path: '/strips/new',
    ready: (page) => seen(page, 'No stimulus is given.'),
    act: (page) => page.getByRole('button', { name: 'Save strip' }).click(),
  },
  {
    name: 'recorder bench',
    path: '/recorder',
    ready: (page) => seen(page, 'declares no diagnostic band'),
  },
  {
    name: 'recorder lesson with the difference and the marker',
    path: '/recorder?source=lesson.notch-ringing&marker=on&view=difference',
    ready: (page) => seen(page, 'a band for adults'),
  },
  {
    name: 'test signal through four settings',
    path: '/recorder?source=signal.pulse&setting=monitor&setting=zero0.67withdiagnostic&setting=sampled&setting=0.67to100-notch50',
    ready: (page) => seen(page, 'offline'),
  },
  ...exportStates(readFileSync('tests/fixtures/preset-file-2.json')),
  ...[
    ['sheet', ''],
    ['sheet of chosen leads, upright', '?orientation=portrait&layout=stacked&leads=II.V1.aVR&page=2'],
    ['sheets of several strips', '?layout=single&and=demand-pacing-inhibited&and=spikes-over-asystole'],
    ['sheet with a strip that is gone', '?layout=12x1&and=no-such-strip'],
  ].map(([name, search]): PageState => ({
    name,
    path: `/strips/av-sequential-pacing/sheet${search}`,
    async ready(page) {
      await sheetReady(page);
      if (name.endsWith('gone')) await seen(page, 'A strip of these sheets is not there.');
    },
  })),
  {
    name: 'sheet, closer, adding a strip',
    path: '/strips/av-sequential-pacing/sheet',
    ready: sheetReady,
    async act(page) {
      await page.getByRole('radio', { name: 'Closer' }).click();
      await page.getByRole('button', { name: 'Add a strip' }).click();
      await page.getByRole('list', { name: 'Strips found' }).waitFor();
    },
  },
  { name: 'help', path: '/help', ready: (page) => seen(page, 'What bandwidth does') },
  { name: 'nothing here', path: '/nowhere', ready: (page) => seen(page, 'There is nothing here') },
];

async function check(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map((node) => node.html).join(' | ')}`)).toEqual(
    [],
  );
  const overflow = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
  expect(overflow).toBeLessThanOrEqual(0);
}

describe.skipIf(!hasBrowser())('every page at every width is accessible and fits', () => {
  const { visit } = useProduct();

  for (const size of sizes) {
    it(`sign-in at ${size.width} px`, async () => {
      const page = await visit(size);
      await page.goto('/sign-in');
      await seen(page, 'Enter as one of its people:');
      await check(page);
    });

    it(`all states at ${size.width} px`, async () => {
      const page = await visit(size);
      await signInAs(page, 'educator');
      for (const state of states) {
        await page.unrouteAll();
        await state.before?.(page);
        await page.goto(state.path);
        await state.ready(page);
        await state.act?.(page);
        await check(page).catch((error: Error) => {
          throw new Error(`${state.name} at ${size.width} px: ${error.message}`);
        });
      }
    });
  }
});
