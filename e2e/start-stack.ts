import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';

/**
 * Starts database, stub and server in a process of their own before the first journey, and ends it after the last.
 * Journeys read KINVALE_URL and KINVALE_ACCOUNTS (JSON: role, email and password of each demo person). Where both are
 * given, that stack is used and left running. KINVALE_ADMIN_URL is its database, for who counts what lies in there.
 */
export default async function startStack(): Promise<() => Promise<void>> {
  if (process.env['KINVALE_URL'] !== undefined && process.env['KINVALE_ACCOUNTS'] !== undefined)
    return () => Promise.resolve();
  const script = fileURLToPath(new URL('../tools/e2e-stack.mjs', import.meta.url));
  // The open stdin tells the stack that we live: it stops by itself should this process be killed.
  const stack = spawn(process.execPath, [script], { stdio: ['pipe', 'pipe', 'inherit'] });
  const exited = once(stack, 'exit');
  const firstLine = once(createInterface({ input: stack.stdout }), 'line') as Promise<[string]>;
  const ready = await Promise.race([firstLine, exited.then(() => undefined)]);
  if (ready === undefined)
    throw new Error('the stack for the journeys did not start; it says why above');
  const { url, adminUrl, accounts } = JSON.parse(ready[0]) as {
    url: string;
    adminUrl: string;
    accounts: unknown;
  };
  process.env['KINVALE_URL'] = url;
  process.env['KINVALE_ADMIN_URL'] = adminUrl;
  process.env['KINVALE_ACCOUNTS'] = JSON.stringify(accounts);
  return async () => {
    stack.stdin.end();
    await exited;
  };
}
