import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatCheckboxHarness } from '@angular/material/checkbox/testing';
import { MatDialogHarness } from '@angular/material/dialog/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { AskReason } from './ask-reason';
import type { ReasonAnswer, ReasonQuestion } from './reason-dialog';

@Component({
  selector: 'kv-empty-page',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class EmptyPage {}

const question: ReasonQuestion = {
  title: 'Why 9 companies out?',
  companies: Array.from({ length: 9 }, (_, place) => `Company ${place}`),
  action: 'Leave 9 out',
  reasons: ['Another business', 'Other cycle'],
  written: 2,
};

describe('one reason for several companies', () => {
  async function asked(about: ReasonQuestion) {
    const loader = TestbedHarnessEnvironment.documentRootLoader(TestBed.createComponent(EmptyPage));
    let answer: ReasonAnswer | null | undefined;
    const answered = TestBed.inject(AskReason)
      .ask(about)
      .then((given) => (answer = given));
    await expectAsync(opened(loader)).toBeResolved();
    const dialog = await loader.getHarness(MatDialogHarness);
    const button = (text: string) => dialog.getHarness(MatButtonHarness.with({ text }));
    return { dialog, button, answered, answer: () => answer };
  }

  /** The dialog's code loads on first use. */
  async function opened(
    loader: ReturnType<typeof TestbedHarnessEnvironment.documentRootLoader>,
  ): Promise<void> {
    for (let turn = 0; turn < 100; turn++) {
      if ((await loader.getAllHarnesses(MatDialogHarness)).length > 0) return;
      await new Promise((resolve) => setTimeout(resolve, 20));
    }
    throw new Error('expected an open dialog; found none');
  }

  it('names the companies, and waits for a reason', async () => {
    const { dialog, button, answered, answer } = await asked(question);
    expect(await dialog.getText()).toContain('Company 7 and 1 more.');
    const goOn = await button('Leave 9 out');
    expect(await goOn.isDisabled()).toBeTrue();
    await (await dialog.getHarness(MatInputHarness)).setValue('  Other standard ');
    expect(await goOn.isDisabled()).toBeFalse();
    await goOn.click();
    await answered;
    expect(answer()).toEqual({ reason: 'Other standard', replaces: false });
  });

  it('takes over a reason already written, also in place of others on request', async () => {
    const { dialog, button, answered, answer } = await asked(question);
    const list = document.querySelector<HTMLSelectElement>('kv-reason-dialog select')!;
    list.value = 'Other cycle';
    list.dispatchEvent(new Event('change'));
    await (await dialog.getHarness(MatCheckboxHarness)).check();
    await (await button('Leave 9 out')).click();
    await answered;
    expect(answer()).toEqual({ reason: 'Other cycle', replaces: true });
  });

  it('answers nothing where it is put away', async () => {
    const { button, answered, answer } = await asked({ ...question, reasons: [], written: 0 });
    expect(
      document.querySelector('kv-reason-dialog select, kv-reason-dialog mat-checkbox'),
    ).toBeNull();
    await (await button('Keep it as it is')).click();
    await answered;
    expect(answer()).toBeNull();
  });
});
