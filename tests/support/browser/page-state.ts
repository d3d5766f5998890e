import type { Page } from 'playwright-core';

/** A page in a state that is to be looked at. */
export interface PageState {
  name: string;
  path: string;
  /** What to prepare before the page is opened. */
  before?(page: Page): Promise<void>;
  /** What to do before looking. */
  act?(page: Page): Promise<void>;
  /** Something that is there when the page is ready. */
  ready(page: Page): Promise<void>;
}

export const seen = (page: Page, text: string): Promise<void> => page.getByText(text).first().waitFor();
