/** `npm run build`: builds what changed since the last build. */
import { fileURLToPath } from 'node:url';
import { buildWhenChanged } from './build-when-changed.mjs';
import { inOneSentence } from './plain-failure.mjs';

try {
  await buildWhenChanged(fileURLToPath(new URL('..', import.meta.url)), {
    say: (text) => console.log(text),
    onText: (text) => process.stdout.write(text),
  });
} catch (error) {
  console.error(inOneSentence(error));
  process.exitCode = 1;
}
