import { expect, test } from '../pages/checked-page';
import { invented } from '../pages/demo-accounts';
import { PreparedWorkspace } from '../pages/prepared-workspace';
import { ScenariosPage } from '../pages/scenarios-page';

test('plans, keeps the unsaved plan, warns, saves, copies, deletes and takes it back', async ({
  page,
}) => {
  const workspace = new PreparedWorkspace(page);
  await workspace.signUp(invented('Runa Tessmark'), 'Velmara planning');
  await workspace.fitSample();
  const plan = await new ScenariosPage(page).open();

  await test.step('figures follow the slider at once', async () => {
    const before = await plan.year(2026);
    await plan.press('Capex FY2026', 'ArrowRight', 2);
    await plan.expectDifferent(2026, before);
    expect((await plan.year(2026)).difference).toMatch(/^\+[\d.,]+ \([\d.,−]+ to [\d.,−]+\)$/);
    await plan.press('Capex FY2026', 'ArrowLeft', 2);
    await expect.poll(() => plan.year(2026)).toEqual(before);
  });

  await test.step('a pasted block comes in whole and goes in one step', async () => {
    const before = await plan.year(2026);
    await plan.paste(2026, 0, '1.234,5\t2.000,0\n(12)\tlots');
    await expect(plan.cell(2026, 0)).toHaveText('1,235');
    await expect(plan.cell(2027, 1)).toHaveAttribute('title', 'expected a number; found lots');
    await plan.undoPaste();
    await expect.poll(() => plan.year(2026)).toEqual(before);
  });

  await test.step('a rule fills a regressor, and ends with Undo when a cell under it is typed', async () => {
    await plan.grow('capex', '5');
    await expect(plan.rule(/Capex grows 5 % a year from FY2025’s/)).toBeVisible();
    await plan.typeCell(2027, 0, '300');
    await expect(plan.rule(/Capex is entered year by year/)).toBeVisible();
    await plan.undo();
    await expect(plan.rule(/Capex grows 5 % a year/)).toBeVisible();
    await plan.reset();
  });

  await test.step('a plan that is not saved comes back after a reload', async () => {
    const before = await plan.year(2026);
    await plan.press('Capex FY2026', 'PageUp');
    await plan.expectDifferent(2026, before);
    const left = await plan.year(2026);
    await plan.expectDraftKept();
    await plan.open();
    await expect(plan.restored).toBeVisible();
    await expect.poll(() => plan.year(2026)).toEqual(left);
  });

  await test.step('a plan far from what was seen is marked, and led back inside', async () => {
    await plan.enter('Capex FY2026', '25000');
    await expect(plan.note(/FY2026 is outside the familiar range/)).toBeVisible();
    await expect.poll(async () => (await plan.year(2026)).familiar).toBe('outside');
    await plan.setToNearestInside(2026);
    await expect(plan.note(/FY2026 is outside the familiar range/)).toHaveCount(0);
    await expect.poll(async () => (await plan.year(2026)).familiar).toBe('inside');
  });

  await test.step('a saved plan can be copied, deleted and taken back', async () => {
    await plan.addYear(2029);
    await plan.enter('Book equity FY2029', '2600');
    await plan.name('Lower payout');
    await plan.save();
    await expect(page).toHaveURL(/\/scenarios\/[0-9a-f-]{36}$/); // amounts never stand in an address
    const saved = await plan.year(2029);
    await plan.copy();
    await expect(plan.nameBox).not.toHaveValue('Lower payout');
    await expect(plan.other('Lower payout')).toBeVisible();
    await expect.poll(() => plan.year(2029)).toEqual(saved);
    await plan.other('Lower payout').click();
    await expect(plan.nameBox).toHaveValue('Lower payout');
    await plan.delete();
    await expect(plan.nameBox).toHaveValue('');
    await expect(plan.other('Lower payout')).toHaveCount(0);
    await plan.undo();
    await expect(plan.nameBox).toHaveValue('Lower payout');
    await expect.poll(() => plan.year(2029)).toEqual(saved);
  });

  await test.step('an earlier version comes back as a new one', async () => {
    const first = await plan.year(2026);
    await plan.typeCell(2026, 0, '300');
    await plan.save();
    await plan.expectDifferent(2026, first);
    await plan.putBack(1);
    await expect.poll(() => plan.year(2026)).toEqual(first);
    await expect(page.getByText(/Saved as version 3/)).toBeVisible();
  });
});
