import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { hasBrowser, signInAs } from '../support/browser/browser';
import { useProduct } from '../support/browser/use-product';

// Whole journeys in Debian's Chromium against the built product.
describe.skipIf(!hasBrowser())('in the browser', () => {
  const { product, visit } = useProduct();
  const reading = (page: Page) => page.getByRole('region', { name: 'Reading' });
  const openGroup = (page: Page, name: string) =>
    page.getByRole('region', { name: 'Parameters' }).getByRole('button', { name }).click();
  const type = async (page: Page, label: string, value: string): Promise<void> => {
    const field = page.getByRole('textbox', { name: label, exact: true });
    await field.fill(value);
    await field.press('Enter');
  };
  const choose = async (page: Page, label: string, option: string): Promise<void> => {
    await page.getByRole('combobox', { name: label, exact: true }).click();
    await page.getByRole('option', { name: option, exact: true }).click();
  };
  async function saveAs(page: Page, title: string): Promise<void> {
    await page.getByRole('button', { name: 'Save strip' }).click();
    const dialog = page.getByRole('dialog');
    await dialog.getByLabel('Title').fill(title);
    await dialog.getByRole('radio', { name: 'My department' }).click();
    await dialog.getByRole('button', { name: 'Save strip' }).click();
    await page.waitForURL(/\/strips\/[0-9a-f-]{36}$/);
  }

  it('makes an AV sequential strip from nothing, saves it, reloads it and finds it again', async () => {
    const page = await visit();
    await signInAs(page, 'educator');
    await page.getByRole('link', { name: 'New strip' }).click();
    await reading(page).getByText('No stimulus is given.').waitFor();
    await choose(page, 'AV conduction', 'Complete block');
    await type(page, 'Atrial rate', '42');
    await openGroup(page, 'Pacing');
    await choose(page, 'Pacing', 'Implanted');
    await type(page, 'Lower rate', '66');
    await reading(page)
      .getByText('Atrium and right ventricle are stimulated in sequence, 180 ms apart.')
      .waitFor();
    await type(page, 'Paced AV delay', '0.15 s');
    await reading(page).getByText('in sequence, 150 ms apart.').waitFor();
    await saveAs(page, 'Sequence for Thursday');
    await page.reload();
    await page.getByRole('heading', { name: 'Sequence for Thursday' }).waitFor();
    await reading(page).getByText('in sequence, 150 ms apart.').waitFor();
    await page.getByRole('link', { name: 'Strips', exact: true }).click();
    await page.getByLabel('Search strips').fill('thursday');
    await page.getByRole('link', { name: 'Sequence for Thursday' }).waitFor();
    await page.getByText('1 strip', { exact: true }).waitFor();
  });

  it('reads lost capture when the output drops below the threshold, and takes it back with undo', async () => {
    const page = await visit();
    await signInAs(page, 'technician');
    await page.goto('/strips/ventricular-pacing-apex');
    await reading(page).getByText('Every stimulus in the right ventricle captures.').waitFor();
    await openGroup(page, 'Leads and capture');
    await type(page, 'Output', '0.5');
    await reading(page).getByText('the output is below the threshold').waitFor();
    await page.getByRole('button', { name: 'Undo' }).click();
    await reading(page).getByText('Every stimulus in the right ventricle captures.').waitFor();
    await page.getByRole('button', { name: 'Redo' }).click();
    await reading(page).getByText('the output is below the threshold').waitFor();
  });

  it('refuses bad values in words at the field, and keeps the strip', async () => {
    const page = await visit();
    await signInAs(page, 'educator');
    await page.goto('/strips/new');
    await openGroup(page, 'Pacing');
    await choose(page, 'Pacing', 'Implanted');
    await type(page, 'Paced AV delay', '400');
    await page.getByText('400 ms is above 350 ms, the most allowed. The strip still shows 180 ms.').waitFor();
    await type(page, 'Lower rate', 'fast');
    await page.getByText('“fast” is not a number or a quantity in /min.').waitFor();
    await type(page, 'Lower rate', '800 ms');
    expect(await page.getByRole('textbox', { name: 'Lower rate', exact: true }).inputValue()).toBe('75');
  });

  it('shows two bandwidths under each other, all twelve leads, and reads calipers', async () => {
    const page = await visit();
    await signInAs(page, 'educator');
    await page.goto('/strips/av-sequential-pacing');
    await reading(page).waitFor();
    const strip = page.getByRole('img', { name: /Arrow keys walk the beats/ });
    const before = (await strip.boundingBox())?.height ?? 0;
    await page.getByLabel('Second bandwidth').click();
    await page.getByRole('option', { name: 'Beside monitor' }).click();
    await expect.poll(async () => (await strip.boundingBox())?.height ?? 0).toBeGreaterThan(1.5 * before);
    await page.getByRole('radio', { name: 'All twelve' }).click();
    await expect.poll(async () => (await strip.boundingBox())?.height ?? 0).toBeGreaterThan(4 * before);
    await page.getByRole('button', { name: 'Calipers' }).click();
    await strip.click({ position: { x: 300, y: 100 } });
    await strip.click({ position: { x: 425, y: 100 } });
    await page.getByText('1000 ms, 25.0 mm, 60 /min').waitFor();
    await strip.press('ArrowRight');
    await page.getByText('1008 ms, 25.2 mm, 60 /min').waitFor();
  });

  it('copies the strip as its sheet, and saves it where the browser refuses', async () => {
    const page = await visit();
    await page.context().grantPermissions(['clipboard-read', 'clipboard-write']);
    await signInAs(page, 'educator');
    await page.goto('/strips/av-sequential-pacing');
    await reading(page).getByText('stimulated in sequence').waitFor();
    const copiedSize = () =>
      page.evaluate(async () => {
        const [item] = await navigator.clipboard.read();
        const picture = await createImageBitmap(await item.getType('image/png'));
        return { width: picture.width, height: picture.height };
      });
    await page.getByRole('button', { name: 'Copy picture' }).click();
    await page.getByText('Picture copied').first().waitFor();
    const two = await copiedSize();
    // Ten seconds at 25 mm/s with calibration and margins, 8 pixels a millimetre.
    expect(two.width).toBeGreaterThan(8 * 280);
    expect(two.width).toBeLessThan(8 * 310);
    await page.getByRole('radio', { name: 'All twelve' }).click();
    await page.getByRole('button', { name: 'Copy picture' }).click();
    await expect.poll(async () => (await copiedSize()).height).toBeGreaterThan(2.5 * two.height);
    await page.evaluate(() => {
      navigator.clipboard.write = () => Promise.reject(new Error('refused'));
    });
    const download = page.waitForEvent('download');
    await page.getByRole('button', { name: 'Copy picture' }).click();
    expect((await download).suggestedFilename()).toBe('strip.png');
    await page.getByText('Picture saved as strip.png').first().waitFor();
  });

  it('walks the beats by keyboard and ties sentences to them', async () => {
    const page = await visit();
    await signInAs(page, 'educator');
    await page.goto('/strips/capture-lost-junctional-escape');
    const strip = page.getByRole('img', { name: /Arrow keys walk the beats/ });
    await strip.focus();
    await strip.press('ArrowRight');
    await strip.press('ArrowRight');
    const chip = page
      .getByRole('list', { name: 'Beats' })
      .getByRole('button', { name: 'Beat 2', exact: true });
    expect(await chip.getAttribute('aria-pressed')).toBe('true');
    // The sentence that names the beat is tinted with it, and the line under the ladder says what it is.
    const line = page.getByRole('status', { name: 'Chosen beat' });
    const tinted = reading(page).locator('li.bg-teal-tint');
    const lost = reading(page).getByText('No stimulus in the right ventricle captures');
    const words: string[] = [];
    for (let step = 0; step < 12; step++) {
      words.push(await line.innerText());
      if (words.at(-1)?.includes('captures nothing')) break;
      await strip.press('ArrowRight');
    }
    expect(words.at(-1)).toContain('stimulus from right ventricle captures nothing');
    await expect
      .poll(() => tinted.allInnerTexts())
      .toContainEqual(expect.stringContaining(await lost.innerText()));
    // The ladder is tinted in the same column: pointing at it there names the same beat.
    const ladder = page.getByRole('img', { name: /^Ladder diagram/ });
    const chosen = await page.locator('button[aria-pressed=true][aria-label^="Beat "]').first().boundingBox();
    const box = await ladder.boundingBox();
    if (!chosen || !box) throw new Error('not drawn');
    const middle = chosen.x + chosen.width / 2;
    await page.getByRole('button', { name: 'Previous beat' }).click();
    await page.mouse.click(middle, box.y + box.height / 2);
    expect(await line.innerText()).toBe(words.at(-1));
    expect(Math.abs(box.x - ((await strip.boundingBox())?.x ?? 0))).toBeLessThan(0.01);
  });

  it('finds undersensing when the sensitivity is turned past the signal, and a stimulus on the T wave', async () => {
    const page = await visit();
    await signInAs(page, 'educator');
    await page.goto('/strips/new');
    await openGroup(page, 'Pacing');
    await choose(page, 'Pacing', 'Implanted');
    await choose(page, 'Mode', 'VVI');
    await reading(page).getByText('Ventricular sensing is appropriate.').waitFor();
    await openGroup(page, 'Leads and capture');
    await page.getByRole('tab', { name: 'Right atrium, no lead' }).click();
    await page.getByText('With the mode VVI there is no lead here').waitFor();
    await page.getByRole('tab', { name: 'Right ventricle' }).click();
    await type(page, 'Sensitivity', '12');
    await reading(page)
      .getByText(/Ventricular undersensing: .* QRS complexes are not sensed\./)
      .waitFor();
    await type(page, 'Sensitivity', '8');
    await reading(page).getByText('Ventricular sensing is appropriate.').waitFor();
    await page.getByRole('tab', { name: 'Faults' }).click();
    await page.getByRole('button', { name: 'Add a fault' }).click();
    await choose(page, 'Fault', 'Undersensing');
    await reading(page)
      .getByText(/Ventricular undersensing/)
      .waitFor();
    await page.getByRole('button', { name: 'Remove fault 1' }).click();
    await reading(page).getByText('Ventricular sensing is appropriate.').waitFor();
  });

  it('finds the transcutaneous threshold as at the bedside, down and up again', async () => {
    const page = await visit();
    await signInAs(page, 'technician');
    await page.goto('/strips/new');
    await choose(page, 'AV conduction', 'Complete block');
    await openGroup(page, 'Pacing');
    await choose(page, 'Pacing', 'Transcutaneous');
    await page.getByText('Confirm capture with a pulse.').waitFor();
    const modes = page.getByRole('radiogroup', { name: 'Mode' }).getByRole('radio');
    expect(await modes.allInnerTexts()).toEqual(['VOO', 'VVI']);
    await openGroup(page, 'Leads and capture');
    const every = reading(page).getByText('Every stimulus through the chest pads captures.');
    const none = reading(page).getByText(
      'No stimulus through the chest pads captures: the output is below the threshold.',
    );
    await every.waitFor();
    for (const [current, outcome] of [
      ['61', every],
      ['60', every],
      ['59', none],
      ['40', none],
      ['60', every],
    ] as const) {
      await type(page, 'Current', current);
      await outcome.waitFor();
    }
    // A narrower pulse needs more: 60 mA at 10 ms is below the threshold of 72 mA.
    await type(page, 'Pulse width', '10');
    await none.waitFor();
    await type(page, 'Current', '72');
    await every.waitFor();
  });

  it('says why a combination is refused, and shows only what applies', async () => {
    const page = await visit();
    await signInAs(page, 'educator');
    await page.goto('/strips/new');
    await openGroup(page, 'Leads and capture');
    await page.getByText('There is no pacemaker on this strip.').waitFor();
    await openGroup(page, 'Pacing');
    await choose(page, 'Pacing', 'Implanted');
    await type(page, 'Lower rate', '130');
    await page
      .getByText(/upperTrackingRateBpm: 120 is not allowed; allowed: at least the lower rate/)
      .waitFor();
    await type(page, 'Lower rate', '60');
    await type(page, 'Hysteresis rate', '70');
    await page.getByText(/Allowed: null or below the lower rate/).waitFor();
    expect(await page.getByText('Sensor rate').count()).toBe(0);
    await choose(page, 'Mode', 'DDDR');
    await page.getByText('Sensor rate').waitFor();
    await page.getByRole('radiogroup', { name: 'Magnet applied' }).getByRole('radio', { name: 'On' }).click();
    await page.getByText('A magnet lies on the device.').waitFor();
    expect(await page.getByText('PVARP').count()).toBe(0);
    await openGroup(page, 'Patient');
    await choose(page, 'Atrial rhythm', 'Atrial flutter');
    expect(await page.getByRole('textbox', { name: 'Atrial rate', exact: true }).inputValue()).toBe('300');
  });

  it('keeps a draft through a reload, and carries one in the address', async () => {
    const page = await visit();
    await signInAs(page, 'educator');
    await page.goto('/strips/new');
    await type(page, 'Atrial rate', '88');
    await page.getByText('Not saved yet').waitFor();
    page.once('dialog', (dialog) => void dialog.accept());
    await page.reload();
    await page.getByText('Your unsaved changes are back.').waitFor();
    expect(await page.getByRole('textbox', { name: 'Atrial rate', exact: true }).inputValue()).toBe('88');
    await page.getByRole('button', { name: 'More actions' }).click();
    await page.getByRole('menuitem', { name: 'Copy address of this draft' }).click();
    await expect.poll(() => page.url()).toContain('#draft=');
    const address = page.url();
    const other = await visit();
    await signInAs(other, 'technician');
    await other.goto(address);
    await other.getByText('This draft came with the address.').waitFor();
    expect(await other.getByRole('textbox', { name: 'Atrial rate', exact: true }).inputValue()).toBe('88');
    await other.goto('/help');
    await other.goto('/strips/new#draft=broken');
    await other.getByText('The draft in the address cannot be read.').waitFor();
  });

  it('asks before unsaved work is left', async () => {
    const page = await visit();
    await signInAs(page, 'educator');
    await page.goto('/strips/new');
    await type(page, 'Atrial rate', '91');
    await page.getByRole('link', { name: 'Help' }).click();
    await page.getByRole('dialog', { name: 'Leave without saving?' }).waitFor();
    await page.getByRole('button', { name: 'Keep editing' }).click();
    expect(page.url()).toContain('/strips/new');
    await page.getByRole('link', { name: 'Help' }).click();
    await page.getByRole('button', { name: 'Leave' }).click();
    await page.getByRole('heading', { name: 'How Paceloom works' }).waitFor();
  });

  it('loses nothing when two people save the same strip', async () => {
    const first = await visit();
    await signInAs(first, 'educator');
    await first.goto('/strips/new');
    await type(first, 'Atrial rate', '77');
    await saveAs(first, 'Shared between tabs');
    const address = first.url();
    const second = await first.context().newPage();
    await second.goto(address);
    await type(second, 'Atrial rate', '99');
    await second.getByRole('button', { name: 'Save version' }).click();
    await second.getByText('Version 2, saved').waitFor();
    await type(first, 'Atrial rate', '55');
    await first.getByRole('button', { name: 'Save version' }).click();
    const dialog = first.getByRole('dialog', { name: /someone saved in between/ });
    await dialog.waitFor();
    await dialog.getByRole('button', { name: 'Save mine as a new strip' }).click();
    const details = first.getByRole('dialog', { name: 'Save as a new strip' });
    await details.getByLabel('Title').fill('My own fifty-five');
    await details.getByRole('button', { name: 'Save strip' }).click();
    await first.getByRole('heading', { name: 'My own fifty-five' }).waitFor();
    expect(await first.getByRole('textbox', { name: 'Atrial rate', exact: true }).inputValue()).toBe('55');
    await second.reload();
    expect(await second.getByRole('textbox', { name: 'Atrial rate', exact: true }).inputValue()).toBe('99');
  });

  it('deletes with undo, and duplicates a gallery strip', async () => {
    const page = await visit();
    await signInAs(page, 'educator');
    await page.goto('/strips/atrial-pacing');
    await page.getByRole('button', { name: 'More actions' }).click();
    await page.getByRole('menuitem', { name: 'Duplicate the saved strip' }).click();
    await page.getByRole('heading', { name: /Copy of Atrial pacing/ }).waitFor();
    await page.goto('/strips?search=copy+of+atrial');
    await page.getByRole('button', { name: /Actions for Copy of Atrial pacing/ }).click();
    await page.getByRole('menuitem', { name: 'Delete' }).click();
    await page.getByRole('dialog').getByRole('button', { name: 'Delete' }).click();
    await page.getByText('No strip fits').waitFor();
    await page.getByRole('button', { name: 'Undo' }).click();
    await page.getByRole('link', { name: /Copy of Atrial pacing/ }).waitFor();
  });

  it('goes on after a restart of the server', async () => {
    const page = await visit();
    await signInAs(page, 'educator');
    await page.goto('/strips/new');
    await type(page, 'Atrial rate', '64');
    await product().restart();
    await saveAs(page, 'Saved after a restart');
    await page.getByText('Version 1, saved').waitFor();
  });
});
