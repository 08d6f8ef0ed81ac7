import { randomBytes } from 'node:crypto';
import { chmod, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';

const names = ['ownerPassword', 'appPassword', 'sessionSecret'];

/** The secrets of a private installation, made once and kept in a file that only its owner reads. */
export async function localSecrets(folder) {
  const path = join(folder, 'secrets.json');
  const known = await readFile(path, 'utf8').then(JSON.parse, (error) => {
    if (error.code === 'ENOENT') return {};
    throw error;
  });
  const secrets = Object.fromEntries(
    names.map((name) => [name, known[name] ?? randomBytes(32).toString('base64url')]),
  );
  await writeFile(path, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600 });
  await chmod(path, 0o600);
  return secrets;
}
