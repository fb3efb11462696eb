/** What a person does and sees in the window, in the words the tests use. */

import type { Locator } from 'playwright-core';
import type { Desktop } from './launch';

export class Person {
  private readonly desktop: Desktop;

  constructor(desktop: Desktop) {
    this.desktop = desktop;
  }

  private get page() {
    return this.desktop.page;
  }

  /** Waits until readings and tracks belong to the newest study. */
  async settled(): Promise<void> {
    await this.page.waitForFunction(() => {
      const { readings, tracks } = document.body.dataset;
      return readings !== undefined && readings === tracks && !document.querySelector('.outdated');
    });
  }

  /** Does something that changes the study, and waits for the new readings and tracks. */
  async changes(act: () => Promise<unknown>): Promise<void> {
    const before = await this.page.evaluate(() => document.body.dataset.readings);
    await act();
    await this.page.waitForFunction((old) => document.body.dataset.readings !== old, before);
    await this.settled();
  }

  press(keys: string): Promise<void> {
    return this.page.keyboard.press(keys);
  }

  field(path: string): Locator {
    return this.page.locator(`[data-path="${path}"]`);
  }

  /** The head of a step's card, by the step's number. */
  step(number: number): Locator {
    return this.page.locator(`[data-step="${number}"] .card-head`);
  }

  tool(stepNumber: number, name: string): Locator {
    return this.page.getByRole('toolbar', { name: `Step ${stepNumber}` }).getByLabel(name);
  }

  button(name: string | RegExp): Locator {
    return this.page.getByRole('button', { name, exact: typeof name === 'string' });
  }

  async text(selector: string): Promise<string> {
    return (await this.page.locator(selector).first().textContent()) ?? '';
  }

  status(): Promise<string> {
    return this.text('.status-notice');
  }

  async openStep(number: number): Promise<void> {
    if ((await this.step(number).getAttribute('aria-expanded')) === 'false') await this.step(number).click();
  }

  /** Full-precision sheet resistance of a layer, as pressing it would copy it. */
  async sheetResistance(layer = 1): Promise<number> {
    const title = await this.page
      .locator('.big')
      .nth(layer - 1)
      .getAttribute('title');
    return Number(title?.split('copy ')[1]);
  }

  /** Opens a study from a file, giving up what is unsaved. */
  async opens(path: string): Promise<void> {
    await this.desktop.answerOpen(path);
    const hasWork = (await this.text('.unsaved')) === 'unsaved';
    await this.changes(async () => {
      await this.press('Control+O');
      if (hasWork) await this.button('Discard changes').click();
    });
  }

  /** Drops a file on the window, as a file manager does. */
  async drops(name: string, content: string): Promise<void> {
    const data = await this.page.evaluateHandle(
      ([fileName, text]) => {
        const transfer = new DataTransfer();
        transfer.items.add(new File([text], fileName));
        return transfer;
      },
      [name, content],
    );
    for (const event of ['dragover', 'drop'])
      await this.page.dispatchEvent('.middle', event, { dataTransfer: data });
  }
}
