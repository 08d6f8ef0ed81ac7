/** Fails when the JavaScript that the first page needs is larger, compressed, than its budget. */
import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { brotliCompressSync, gzipSync } from 'node:zlib';

const budget = 170_000;
const folder = process.argv[2] ?? fileURLToPath(new URL('../dist/browser', import.meta.url));

const page = await readFile(join(folder, 'index.html'), 'utf8');
const asked = [
  ...page.matchAll(/<(?:script[^>]*\ssrc|link[^>]*rel="modulepreload"[^>]*\shref)="([^"]+\.js)"/g),
];
if (asked.length === 0) throw new Error(`expected scripts in ${folder}/index.html; found none`);

// The page preloads what it knows of; what those files import at once is initial too.
const initial = new Map();
const waiting = asked.map(([, path]) => path.replace(/^\//, ''));
for (let file = waiting.shift(); file !== undefined; file = waiting.shift()) {
  if (initial.has(file)) continue;
  const text = await readFile(join(folder, file));
  initial.set(file, text);
  for (const [, imported] of text.toString().matchAll(/(?:\bfrom|\bimport)\s*"\.\/([\w.-]+\.js)"/g))
    waiting.push(imported);
}

let [raw, gzip, brotli] = [0, 0, 0];
for (const text of initial.values()) {
  raw += text.length;
  gzip += gzipSync(text).length;
  brotli += brotliCompressSync(text).length;
}
const kB = (bytes) => `${(bytes / 1000).toFixed(1)} kB`;
console.log(
  `${initial.size} initial scripts: ${kB(raw)}, gzip ${kB(gzip)}, brotli ${kB(brotli)}; budget ${kB(budget)} of gzip`,
);
if (gzip > budget) {
  console.error(`the initial JavaScript is ${kB(gzip - budget)} over its budget`);
  process.exitCode = 1;
}
