import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';
import { sdkFor } from './testing/running-stub';

const main = fileURLToPath(new URL('./main.ts', import.meta.url));

function start(env: Record<string, string>) {
  return spawn(process.execPath, ['--import', 'tsx', main], {
    env: { PATH: process.env['PATH'], ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
}

describe('the process of the Stripe stub', () => {
  it('says where it listens, serves the SDK, and ends with 0 on SIGTERM', async () => {
    const child = start({ STRIPE_STUB_PORT: '0' });
    const exited = once(child, 'exit');
    const [line] = (await once(createInterface(child.stdout), 'line')) as [string];
    const { listening } = JSON.parse(line) as { listening: string };
    expect(listening).toMatch(/^http:\/\/127\.0\.0\.1:\d+$/);
    const stripe = sdkFor(Number(new URL(listening).port));
    expect((await stripe.prices.list()).data.length).toBe(4);
    child.kill('SIGTERM');
    expect(await exited).toEqual([0, null]);
  }, 20_000);

  it('refuses to start in production, unless a test says so', async () => {
    const refused = start({ NODE_ENV: 'production' });
    const [said] = (await once(createInterface(refused.stderr), 'line')) as [string];
    expect(said).toBe('The stub of Stripe does not start with NODE_ENV=production.');
    expect(await once(refused, 'exit')).toEqual([1, null]);

    const allowed = start({ NODE_ENV: 'production', STRIPE_STUB_IN_TESTS: '1' });
    const exited = once(allowed, 'exit');
    await once(createInterface(allowed.stdout), 'line');
    allowed.kill('SIGTERM');
    expect(await exited).toEqual([0, null]);
  }, 20_000);
});
