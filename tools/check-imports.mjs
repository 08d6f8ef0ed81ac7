/** `npm run check-imports`: fails on a forbidden arrow, a circle or a stray index file. */
import { fileURLToPath } from 'node:url';
import { breachesOfImportRules } from './import-rules.mjs';

const { breaches, modules, imports } = await breachesOfImportRules(
  fileURLToPath(new URL('..', import.meta.url)),
);
for (const breach of breaches) console.error(breach);
console.log(`${imports} imports of ${modules} modules read: ${breaches.length} against the rules`);
process.exitCode = breaches.length === 0 ? 0 : 1;
