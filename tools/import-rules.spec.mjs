import { mkdir, mkdtemp, rm, symlink, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { breachesOfImportRules } from './import-rules.mjs';

const project = fileURLToPath(new URL('..', import.meta.url));

/** The import rules applied to a tree of these files; a file that is only named is empty. */
async function breachesOf(files) {
  const root = await mkdtemp(join(tmpdir(), 'kinvale-imports-'));
  try {
    const settings = {
      'package.json':
        '{ "type": "module", "dependencies": { "kysely": "*", "d3": "*", "ml-matrix": "*" } }',
      'tsconfig.json': JSON.stringify({
        compilerOptions: { paths: { '@contract': ['./backend/contract/index.ts'] } },
        files: [],
      }),
    };
    for (const [path, text] of Object.entries({ ...settings, ...files })) {
      await mkdir(dirname(join(root, path)), { recursive: true });
      await writeFile(join(root, path), text || 'export type Nothing = undefined;');
    }
    await symlink(join(project, 'node_modules'), join(root, 'node_modules'));
    return (await breachesOfImportRules(root)).breaches;
  } finally {
    await rm(root, { recursive: true, force: true });
  }
}

const forbidden = [
  ['the engine reads from the database', 'backend/stats/a.ts', 'db/b.ts', 'backend/stats-imports'],
  [
    'prediction leans on the engine',
    'backend/stats/prediction/a.ts',
    'backend/stats/b.ts',
    'backend/stats/prediction-imports',
  ],
  ['the engine uses Node.js', 'backend/stats/a.ts', 'node:fs', 'backend/stats-imports'],
  ['a service knows Kysely', 'backend/fits/fit-service.ts', 'kysely', 'sql-lives-in-db'],
  ['a service opens a connection', 'backend/fits/fit-service.ts', 'pg', 'pool-lives-in-db'],
  [
    'a service makes a reply',
    'backend/fits/fit-service.ts',
    'backend/fits/fit-reply.ts',
    'replies-at-the-edge',
  ],
  [
    'a spec of a service knows Kysely',
    'backend/fits/fit-service.spec.ts',
    'kysely',
    'sql-lives-in-db',
  ],
  [
    'a service knows the contract',
    'backend/fits/fit-service.ts',
    'backend/contract/index.ts',
    'routes-speak-http',
  ],
  [
    'a feature calls a later one',
    'backend/panels/panel-service.ts',
    'backend/fits/fit-service.ts',
    'backend/panels-imports',
  ],
  [
    'a feature takes more than a service from an earlier one',
    'backend/fits/a.ts',
    'backend/panels/b.ts',
    'backend/fits-imports',
  ],
  [
    'a service imports a repository itself',
    'backend/fits/fit-service.ts',
    'db/repositories/fits.ts',
    'repositories-by-type',
  ],
  [
    'a compute worker knows http',
    'backend/compute/fit-worker.ts',
    'backend/http/session.ts',
    'backend/compute-imports',
  ],
  [
    'a screen knows another feature',
    'src/app/fits/a.ts',
    'src/app/panels/b.ts',
    'feature-to-feature',
  ],
  [
    'a chart knows a feature',
    'src/app/charts/a.ts',
    'src/app/fits/b.ts',
    'screen-ground-to-feature',
  ],
  [
    'a screen reaches past the door of the contract',
    'src/app/api/a.ts',
    'backend/contract/fits.ts',
    'src-imports',
  ],
  ['a screen draws with d3', 'src/app/charts/a.ts', 'd3', 'src-imports'],
  ['a stub knows the product', 'stubs/stripe/main.ts', 'backend/errors/a.ts', 'stubs-imports'],
  ['the server imports a tool', 'backend/main.ts', 'tools/a.ts', 'nobody-imports-tools'],
  [
    'the server imports a test fixture',
    'backend/fits/a.ts',
    'backend/fits/testing/b.ts',
    'production-imports-no-tests',
  ],
  ['a folder opens a fifth door', 'backend/http/a.ts', 'backend/http/index.ts', 'door-only'],
  ['a package is not listed', 'backend/figures/a.ts', 'd3-array', 'listed-packages-only'],
];

const allowed = [
  ['the engine uses its matrix package', 'backend/stats/a.ts', 'ml-matrix'],
  ['figures draw on d3', 'backend/figures/a.ts', 'd3'],
  ['db speaks Kysely', 'db/a.ts', 'kysely'],
  [
    'a feature calls the service of an earlier one',
    'backend/fits/fit-service.ts',
    'backend/panels/panel-service.ts',
  ],
  ['routes know the contract', 'backend/fits/fit-routes.ts', 'backend/contract/index.ts'],
  ['the composition root knows db', 'backend/compose.ts', 'db/connect.ts'],
];

function pathFrom(file, target) {
  if (!target.includes('/')) return target;
  return `${'../'.repeat(file.split('/').length - 1)}${target.replace(/\.ts$/, '')}`;
}

describe('the import rules', () => {
  for (const [what, from, to, rule] of forbidden) {
    it(`refuse that ${what}`, async () => {
      const inside = /\.ts$/.test(to) ? { [to]: '' } : {};
      const path = to.startsWith('node:') ? to : pathFrom(from, to);
      const breaches = await breachesOf({ [from]: `import '${path}';`, ...inside });
      expect(breaches.map((line) => line.split(':')[0])).toContain(rule);
    });
  }

  for (const [what, from, to] of allowed) {
    it(`allow that ${what}`, async () => {
      const inside = /\.ts$/.test(to) ? { [to]: '' } : {};
      expect(await breachesOf({ [from]: `import '${pathFrom(from, to)}';`, ...inside })).toEqual(
        [],
      );
    });
  }

  it('allow a service the type of a repository', async () => {
    const files = {
      'backend/fits/fit-service.ts': "import type { Fits } from '../../db/repositories/fits';",
      'db/repositories/fits.ts': 'export interface Fits { readonly id: string }',
    };
    expect(await breachesOf(files)).toEqual([]);
  });

  it('find the contract behind its alias', async () => {
    const files = {
      'src/app/api/fits-api.ts': "import type { Fit } from '@contract';",
      'src/app/ui/amount.ts': "import type { Fit } from '../api/fits-api';",
      'backend/contract/index.ts': 'export interface Fit { readonly id: string }',
    };
    const breaches = await breachesOf(files);
    expect(breaches).toEqual([
      'ui-below-charts-below-nothing: src/app/ui/amount.ts → src/app/api/fits-api.ts',
    ]);
  });

  it('refuse a circle that only types close', async () => {
    const files = {
      'backend/stats/one.ts': "import type { Two } from './two'; export type One = Two;",
      'backend/stats/two.ts':
        "import type { One } from './one'; export type Two = One | undefined;",
    };
    const breaches = await breachesOf(files);
    expect(breaches.filter((line) => line.startsWith('no-circle'))).not.toEqual([]);
  });
});
