import type { Browser, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, expect } from 'vitest';
import { launchBrowser, openPage, type Visit } from './browser';
import { startProduct, type Product } from './product';

export interface ProductInBrowser {
  /** The running product. */
  product(): Product;
  /** A page of a visitor of their own, without a session. */
  visit(size?: { width: number; height: number }): Promise<Page>;
  /** The same where errors in the console belong to what is tried. */
  unwatchedVisit(): Promise<Page>;
}

/**
 * Starts the built product and a browser for the journeys of a `describe` block. After each journey every page that it
 * opened must have been without an error or warning in its console and without a request that left the origin.
 */
export function useProduct(): ProductInBrowser {
  let browser: Browser | undefined;
  let product: Product | undefined;
  let visits: Visit[] = [];
  const unwatched = new Set<Visit>();

  function started<T>(part: T | undefined): T {
    if (part === undefined) throw new Error('the product has not been started');
    return part;
  }

  async function open(size?: { width: number; height: number }): Promise<Visit> {
    const opened = await openPage(started(browser), started(product).url, size);
    visits.push(opened);
    return opened;
  }

  beforeAll(async () => {
    product = await startProduct();
    browser = await launchBrowser();
  });
  afterAll(async () => {
    await browser?.close();
    await product?.stop();
  });
  afterEach(async () => {
    const messages = visits.flatMap((one) => (unwatched.has(one) ? [] : one.trouble.messages));
    await Promise.all(visits.map((visit) => visit.context.close()));
    visits = [];
    expect(messages).toEqual([]);
  });

  return {
    product: () => started(product),
    visit: async (size) => (await open(size)).page,
    async unwatchedVisit() {
      const opened = await open();
      unwatched.add(opened);
      return opened.page;
    },
  };
}
