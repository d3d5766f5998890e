import { describe, expect, it } from 'vitest';
import { hasBrowser, signInAs } from '../support/browser/browser';
import { useProduct } from '../support/browser/use-product';

// Who comes in, and how, in Debian's Chromium against the built product.
describe.skipIf(!hasBrowser())('signing in', () => {
  const { visit } = useProduct();

  it('refuses a learner by page and by API', async () => {
    const page = await visit();
    await signInAs(page, 'learner');
    expect(new URL(page.url()).pathname).toBe('/recorder');
    await page.goto('/strips');
    await page.getByRole('heading', { name: 'This page is not for your role' }).waitFor();
    expect((await page.request.get('/api/strips')).status()).toBe(403);
    const render = await page.request.post('/api/strips/render', { data: { parameters: {} } });
    expect(render.status()).toBe(403);
  });

  it('sends a stranger to sign in and back to where they were going', async () => {
    const page = await visit();
    await page.goto('/strips/unipolar-spike');
    await page.waitForURL(/\/sign-in\?from=/);
    await page.getByRole('button', { name: 'Educator', exact: true }).click();
    await page.getByRole('heading', { name: 'Unipolar against bipolar' }).waitFor();
    await page.getByRole('button', { name: /Educator/ }).click();
    await page.getByRole('menuitem', { name: 'Sign out' }).click();
    await page.waitForURL(/\/sign-in/);
    await page.goto('/strips');
    await page.waitForURL(/\/sign-in\?from=/);
  });

  it('moves nothing on the sign-in page when the people of the demonstration arrive late', async () => {
    const page = await visit();
    let release = (): void => undefined;
    const held = new Promise<void>((done) => (release = done));
    await page.route('**/api/demo', async (route) => {
      await held;
      await route.continue();
    });
    await page.goto('/sign-in');
    const button = page.getByRole('button', { name: 'Sign in', exact: true });
    const before = await button.boundingBox();
    release();
    await page.getByText('Enter as one of its people:').waitFor();
    expect(await button.boundingBox()).toEqual(before);
  });

  it('says what is wrong with a password, and locks after too many', async () => {
    const page = await visit();
    await page.goto('/sign-in');
    await page.getByRole('button', { name: 'Sign in', exact: true }).click();
    await page.getByText('Give your password.').waitFor();
    await page.getByLabel('E-mail').fill('nobody@tarnvalley.example');
    await page.getByLabel('Password').fill('wrong');
    for (let attempt = 0; attempt < 11; attempt++) {
      const answer = page.waitForResponse('**/api/session');
      await page.getByRole('button', { name: 'Sign in', exact: true }).click();
      await answer;
    }
    await page.getByText(/Too many attempts\. Wait \d+ minutes?, then try again\./).waitFor();
  });
});
