import type { Browser } from 'playwright-core';
import { build } from 'vite';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { decodeStripBinary } from '../../shared/formats/strip-binary';
import { gallery } from '../../shared/gallery/gallery';
import { leadNames, type LeadName } from '../../shared/parameters/sheet';
import { hasBrowser, launchBrowser, openPage, signInAs } from '../support/browser/browser';
import { startProduct, type Product } from '../support/browser/product';

/** Before the quantiser the two engines may differ by rounding only, mV. */
const roundingMv = 1e-9;

/** The engine as one script, for a page whose security policy is switched off for this test only. */
async function engineScript(): Promise<string> {
  const built = await build({
    configFile: false,
    logLevel: 'error',
    build: {
      write: false,
      lib: { entry: 'tests/support/browser/engine-in-page.ts', formats: ['iife'], name: 'engine' },
    },
  });
  const [{ output }] = [built].flat() as { output: { type: string; code?: string }[] }[];
  const chunk = output.find((one) => one.type === 'chunk');
  if (!chunk?.code) throw new Error('the engine was not built');
  return chunk.code;
}

describe.skipIf(!hasBrowser())('what the server renders is what the page shows', () => {
  let browser: Browser;
  let product: Product;
  beforeAll(async () => {
    product = await startProduct();
    browser = await launchBrowser();
  });
  afterAll(async () => {
    await browser?.close();
    await product?.stop();
  });

  it('exactly after quantising, and within 1e-9 mV before it, for saved and disturbed strips', async () => {
    const context = await browser.newContext({ baseURL: product.url, bypassCSP: true });
    const page = await context.newPage();
    await signInAs(page, 'educator');
    await page.addScriptTag({ content: await engineScript() });
    const disturbed = {
      parameters: {
        disturbance: { baselineWanderMv: 0.3, mainsMv: 0.1, muscleMv: 0.05, motionPerMinute: 20 },
      },
    };
    const requests = [...gallery.slice(0, 6).map(({ id }) => ({ stripId: id })), disturbed];
    for (const request of requests) {
      for (const unquantised of [false, true]) {
        const answer = await page.request.post('/api/strips/render', { data: { ...request, unquantised } });
        const server = decodeStripBinary(new Uint8Array(await answer.body()).buffer);
        const inPage = await page.evaluate(
          ([parameters, exact]) =>
            (
              globalThis as unknown as {
                engine: { render(p: unknown, e: boolean): Record<string, number[]> };
              }
            ).engine.render(parameters, exact as boolean),
          [server.parameters, unquantised] as const,
        );
        for (const lead of leadNames) {
          const ours = inPage[lead];
          const theirs: ArrayLike<number> = server.leads[lead as LeadName];
          expect(ours).toHaveLength(theirs.length);
          const worst = ours.reduce((most, value, i) => Math.max(most, Math.abs(value - theirs[i])), 0);
          expect(worst).toBeLessThanOrEqual(unquantised ? roundingMv : 0);
        }
      }
    }
    await context.close();
  });

  it('and the page’s own worker gives the same samples', async () => {
    const { context, page, trouble } = await openPage(browser, product.url);
    await signInAs(page, 'educator');
    await page.goto('/strips/two-ventricles-together');
    await page.getByText('Both ventricles are stimulated together.').waitFor();
    const answer = await page.request.post('/api/strips/render', {
      data: { stripId: 'two-ventricles-together' },
    });
    const server = decodeStripBinary(new Uint8Array(await answer.body()).buffer);
    const inWorker = await page.evaluate(async (parameters) => {
      const script = performance
        .getEntriesByType('resource')
        .find((entry) => entry.name.includes('strip-worker'));
      const worker = new Worker(script?.name ?? '', { type: 'module' });
      const data = await new Promise<{ recordings: { leads: Record<string, Float32Array> }[] }>((done) => {
        worker.addEventListener('message', (event) => done(event.data as never));
        worker.postMessage({ id: 1, strips: [parameters] });
      });
      worker.terminate();
      return Object.fromEntries(
        Object.entries(data.recordings[0].leads).map(([lead, one]) => [lead, [...one]]),
      );
    }, server.parameters);
    for (const lead of leadNames) expect(inWorker[lead]).toEqual([...server.leads[lead]]);
    await context.close();
    expect(trouble.messages).toEqual([]);
  });
});
