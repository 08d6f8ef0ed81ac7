import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { request } from 'node:http';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';
import { createTransport } from 'nodemailer';

const main = fileURLToPath(new URL('./main.ts', import.meta.url));

function start(env: Record<string, string>) {
  return spawn(process.execPath, ['--import', 'tsx', main], {
    env: { PATH: process.env['PATH'], ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
}

describe('the process of the mail server’s stub', () => {
  it('says where it listens, takes a mail, shows it to this machine alone, and ends with 0 on SIGTERM', async () => {
    const child = start({ NODE_ENV: 'production', SMTP_STUB_IN_TESTS: '1' });
    const exited = once(child, 'exit');
    const [line] = (await once(createInterface(child.stdout), 'line')) as [string];
    const { listening, page } = JSON.parse(line) as { listening: string; page: string };
    expect(listening).toMatch(/^smtp:\/\/127\.0\.0\.1:\d+$/);
    const [from, to] = ['kinvale@velmara.example', 'cfo@velmara.example'];
    await createTransport(listening).sendMail({ from, to, subject: 'Edition 3', text: 'x' });
    expect(await (await fetch(page)).text()).toContain('Edition 3');
    const foreign = request(page, { headers: { Host: 'kinvale.example' } }).end();
    const [reply] = (await once(foreign, 'response')) as [{ statusCode: number; resume(): void }];
    reply.resume();
    expect(reply.statusCode).toBe(403);
    child.kill('SIGTERM');
    expect(await exited).toEqual([0, null]);
  }, 20_000);

  it('refuses to start in production, unless a test says so', async () => {
    const refused = start({ NODE_ENV: 'production' });
    const [said] = (await once(createInterface(refused.stderr), 'line')) as [string];
    expect(said).toBe('The stub of a mail server does not start with NODE_ENV=production.');
    expect(await once(refused, 'exit')).toEqual([1, null]);
  }, 20_000);
});
