import { chromium, type Page } from 'playwright-core';
import { existsSync } from 'node:fs';
import { startServerProcess } from './server-process';

const executablePath = '/usr/bin/chromium';
const changes = 60;
const warmUp = 10;

export interface LatencyFigures {
  p50Ms: number;
  p95Ms: number;
}

export interface PreviewFigures {
  leads3: LatencyFigures;
  leads12: LatencyFigures;
}

/** Runs in the page: from the key's event to the frame after the strip was painted anew. */
async function keyToFrame(): Promise<number> {
  const started = await new Promise<number>((done) =>
    window.addEventListener('keydown', () => done(performance.now()), { once: true, capture: true }),
  );
  return new Promise((done) => {
    const timer = setInterval(() => {
      if (!performance.getEntriesByName('strip-painted').some((mark) => mark.startTime > started)) return;
      clearInterval(timer);
      requestAnimationFrame(() => done(performance.now() - started));
    }, 1);
  });
}

async function measure(page: Page): Promise<LatencyFigures> {
  const ruler = page.getByRole('slider', { name: 'PR interval, ruler' });
  const times: number[] = [];
  for (let i = 0; i < changes + warmUp; i++) {
    await ruler.focus();
    await page.evaluate(() => performance.clearMarks('strip-painted'));
    const measured = page.evaluate(keyToFrame);
    await page.waitForTimeout(30);
    await page.keyboard.press(i % 2 === 0 ? 'ArrowRight' : 'ArrowLeft');
    const ms = await measured;
    if (i >= warmUp) times.push(ms);
  }
  times.sort((a, b) => a - b);
  return { p50Ms: times[times.length >> 1], p95Ms: times[Math.floor(0.95 * times.length)] };
}

/**
 * Latency of the editor's preview in Chromium, from a key on a ruler to the painted frame, with both traces drawn (two
 * renders). null where there is no Chromium.
 */
export async function measurePreview(): Promise<PreviewFigures | null> {
  if (!existsSync(executablePath)) return null;
  const server = await startServerProcess();
  const browser = await chromium.launch({
    executablePath,
    args: ['--no-sandbox', '--disable-background-networking'],
  });
  try {
    const context = await browser.newContext({ viewport: { width: 1440, height: 900 } });
    const [name, value] = server.headers.cookie.split('=');
    await context.addCookies([{ name, value, url: server.url }]);
    const page = await context.newPage();
    await page.goto(`${server.url}/strips/new`);
    await page.getByRole('button', { name: 'Choose leads' }).click();
    await page.getByLabel('V5', { exact: true }).check();
    await page.keyboard.press('Escape');
    const leads3 = await measure(page);
    await page.getByRole('radio', { name: 'All twelve' }).click();
    const leads12 = await measure(page);
    return { leads3, leads12 };
  } finally {
    await browser.close();
    await server.stop();
  }
}
