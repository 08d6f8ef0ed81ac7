import type { HarnessLoader } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatDialogHarness } from '@angular/material/dialog/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { Confirm } from './confirm';
import type { ConfirmQuestion } from './confirm-question';

@Component({
  selector: 'kv-spec-root',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class SpecRoot {}

describe('Confirm', () => {
  let loader: HarnessLoader;

  beforeEach(() => {
    loader = TestbedHarnessEnvironment.documentRootLoader(TestBed.createComponent(SpecRoot));
  });

  async function ask(typed?: string): Promise<{ answer: Promise<boolean> }> {
    const question: ConfirmQuestion = {
      title: 'Remove Mira Oduya',
      detail: 'She can no longer sign in.',
      action: 'Remove member',
      ...(typed === undefined ? {} : { typed }),
    };
    const answer = TestBed.inject(Confirm).ask(question);
    // The dialog loads on first use, outside what the harness waits for.
    while (document.querySelector('kv-confirm-dialog') === null)
      await new Promise((resolve) => setTimeout(resolve, 5));
    return { answer };
  }

  function button(text: string): Promise<MatButtonHarness> {
    return loader.getHarness(MatButtonHarness.with({ text }));
  }

  it('is true when the person agrees', async () => {
    const { answer } = await ask();
    await (await button('Remove member')).click();
    expect(await answer).toBeTrue();
  });

  it('is false when the person keeps things as they are, or leaves by Esc', async () => {
    const kept = await ask();
    await (await button('Keep it as it is')).click();
    expect(await kept.answer).toBeFalse();
    const left = await ask();
    await (await loader.getHarness(MatDialogHarness)).close();
    expect(await left.answer).toBeFalse();
  });

  it('waits for the word where nothing can be taken back', async () => {
    const { answer } = await ask('Oduya');
    const go = await button('Remove member');
    expect(await go.isDisabled()).toBeTrue();
    await (await loader.getHarness(MatInputHarness)).setValue('Oduya');
    expect(await go.isDisabled()).toBeFalse();
    await go.click();
    expect(await answer).toBeTrue();
  });
});
