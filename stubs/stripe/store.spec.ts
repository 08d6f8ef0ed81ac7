import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Store } from './store';
import { startStub } from './testing/running-stub';

describe('the state of the Stripe stub', () => {
  let folder: string;

  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'stripe-stub-'));
  });
  afterEach(() => {
    rmSync(folder, { recursive: true });
  });

  it('survives a restart, idempotency keys included, and leaves no other file', async () => {
    const statePath = join(folder, 'kept', 'state.json');
    const before = await startStub({ statePath });
    const made = await before.stripe.customers.create({ name: 'Velmara' }, { idempotencyKey: 'k' });
    await before.stop();

    const after = await startStub({ statePath });
    const again = await after.stripe.customers.create({ name: 'Velmara' }, { idempotencyKey: 'k' });
    expect(again.id).toBe(made.id);
    expect((await after.stripe.customers.list()).data.length).toBe(1);
    await after.stop();
    expect(readdirSync(join(folder, 'kept'))).toEqual(['state.json']);
  });

  it('keeps nothing of a change that fails half-way', () => {
    const store = new Store();
    expect(() =>
      store.change((state) => {
        state.paymentMethods['pm_1'] = { id: 'pm_1', customer: 'cus_1', testCard: 'pm_card_visa' };
        throw new Error('half-way');
      }),
    ).toThrowError('half-way');
    expect(store.read((state) => Object.keys(state.paymentMethods))).toEqual([]);
  });

  it('refuses a file that it did not write', () => {
    const path = join(folder, 'state.json');
    writeFileSync(path, '{"version":2}');
    expect(() => new Store(path)).toThrowError(
      /expected the stub's state, version 1, in .*found version 2/,
    );
  });
});
