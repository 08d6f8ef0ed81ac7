/**
 * Who may import whom (DEVELOPERS.md says why). Each folder has a list of what it may import; anything else is a
 * forbidden arrow. Types count: an import that only TypeScript sees is an import.
 */

const spec = '\\.spec\\.ts$|/testing/';

/** Packages by name, wherever npm put them; their types with them. */
const packages = (...names) =>
  names.map(
    (name) => `(^|/)node_modules/(${name}|@types/${name.replace('@', '').replace('/', '__')})/`,
  );

const pureFolders = ['backend/stats', 'backend/contract', 'backend/figures', 'backend/panel-data'];
const ground = ['jobs', 'mail', 'files', 'activity', 'entitlement'];
const features = ['accounts', 'panels', 'peers', 'fits', 'scenarios', 'board', 'billing'];
const screens = [
  ...features.filter((name) => name !== 'accounts'),
  'account',
  'members',
  'activity',
];
/** The edge of a feature: its routes, and what only they use: replies, sign-in strategy, request handlers. */
const edge = [
  '-routes\\.ts$',
  '-repl(y|ies)\\.ts$',
  '-strategy\\.ts$',
  '/(load|upload)-[a-z-]+\\.ts$',
  // What an edition freezes and how it leaves the product are written in the words of the contract.
  '^backend/board/(content|pdf|workbook)/',
];
const within = (folder) => `^${folder}/`;

/**
 * Files under `folder` import nothing but `may`. Specs may import test tools and testing/ folders as well.
 *
 * @param options.builtIns  whether Node.js's own modules are allowed.
 * @param options.besides  files under the folder that have a rule of their own.
 */
function only(folder, may, options = {}) {
  const { builtIns = true, besides = [], from = {} } = options;
  const core = builtIns ? { dependencyTypesNot: ['core'] } : {};
  return {
    name: `${folder}-imports`,
    comment: `${folder} may not import this; see the table of import rules.`,
    severity: 'error',
    from: { path: within(folder), pathNot: [spec, ...besides], ...from },
    to: { pathNot: may, ...core },
  };
}

const ofFolder = [
  only('backend/stats', [within('backend/stats'), ...packages('ml-matrix', '@stdlib/[^/]+')], {
    builtIns: false,
    besides: [within('backend/stats/prediction')],
  }),
  only('backend/stats/prediction', [within('backend/stats/prediction')], { builtIns: false }),
  only('backend/contract', [within('backend/contract'), ...packages('zod')], { builtIns: false }),
  only('backend/figures', [within('backend/figures'), ...packages('d3[a-z-]*')], {
    builtIns: false,
  }),
  only(
    'backend/panel-data',
    [within('backend/panel-data'), ...packages('ml-matrix', 'fastest-levenshtein')],
    { builtIns: false },
  ),
  only('backend/errors', [within('backend/errors'), within('backend/contract')]),
  only('backend/http', [
    within('backend/(http|errors|contract)'),
    '^backend/stats/.*stats-error\\.ts$',
    ...packages('express', 'express-session', 'connect-pg-simple', 'helmet'),
    ...packages('pino', 'pino-http', 'passport', 'express-serve-static-core', 'multer', 'zod'),
  ]),
  only('backend/compute', [
    within('backend/(compute|stats|panel-data|errors)'),
    ...packages('piscina', 'csv-parse', 'saxes', 'yauzl'),
  ]),
  ...ground.map((name) =>
    only(`backend/${name}`, [
      within(`backend/(${name}|errors|contract)`),
      within('db/repositories'),
      '^db/errors\\.ts$',
      ...packages(...({ jobs: ['pg-boss', 'pino'], mail: ['nodemailer'] }[name] ?? [])),
    ]),
  ),
  ...features.map((name, place) =>
    only(`backend/${name}`, [
      within(
        `backend/(${name}|errors|compute|stats|figures|panel-data|contract|http|${ground.join('|')})`,
      ),
      // A reply that shows a thing of an earlier feature shows it in that feature's words.
      ...features
        .slice(0, place)
        .map((earlier) => `^backend/${earlier}/[a-z-]+-(service|reply|replies)\\.ts$`),
      within('db/repositories'),
      '^db/errors\\.ts$',
      ...packages('express', 'express-serve-static-core', 'express-session'),
      ...packages(
        ...({
          accounts: ['@node-rs/argon2', 'passport', 'passport-local'],
          panels: ['multer', 'exceljs', 'csv-stringify'],
          fits: ['yazl', 'csv-stringify'],
          board: ['pdfkit', 'exceljs', 'fontkit'],
          billing: ['stripe'],
        }[name] ?? []),
      ),
    ]),
  ),
  only('db', [within('db'), ...packages('kysely', 'pg')]),
  only('stubs', [within('stubs'), '(^|/)node_modules/']),
  only('e2e', [within('e2e'), '^backend/contract/index\\.ts$', '(^|/)node_modules/']),
];

const ofScreens = [
  only(
    'src',
    [
      within('src'),
      '^backend/(contract|stats/prediction|figures|panel-data)/index\\.ts$',
      ...packages('@angular/[^/]+', 'rxjs', 'zod', 'ag-grid-[a-z]+', '@fontsource/[^/]+', 'tslib'),
      ...packages('@stdlib/stats-base-dists-t'), // the quantile that prediction is handed
    ],
    { builtIns: false },
  ),
  {
    name: 'feature-to-feature',
    comment: 'A screen knows api, charts and ui, and no other feature.',
    severity: 'error',
    from: { path: `^src/app/(${screens.join('|')})/` },
    to: { path: `^src/app/(${screens.join('|')}|shell)/`, pathNot: '^src/app/$1/' },
  },
  {
    name: 'screen-ground-to-feature',
    comment: 'Api, charts and ui serve every feature and know none.',
    severity: 'error',
    from: { path: '^src/app/(api|charts|ui)/' },
    to: { path: `^src/app/(${screens.join('|')}|shell)/` },
  },
  {
    name: 'ui-below-charts-below-nothing',
    comment: 'Ui knows neither api nor charts; api knows neither charts nor ui.',
    severity: 'error',
    from: { path: '^src/app/(ui|api)/', pathNot: spec },
    to: { path: '^src/app/(api|charts|ui)/', pathNot: '^src/app/$1/' },
  },
];

const acrossFolders = [
  {
    name: 'no-circle',
    comment: 'Circles, types included, hide which of two ideas comes first.',
    severity: 'error',
    from: {},
    to: { circular: true },
  },
  {
    name: 'routes-speak-http',
    comment: 'Only routes and the replies they send know the contract and http.',
    severity: 'error',
    from: {
      path: `^backend/(${features.join('|')})/`,
      pathNot: [spec, ...edge],
    },
    to: {
      path: ['^backend/(contract|http)/', ...packages('express', 'multer')],
    },
  },
  {
    name: 'repositories-by-type',
    comment: 'Services get their repositories handed in; they import only their types.',
    severity: 'error',
    from: { path: `^backend/(${[...features, ...ground].join('|')})/`, pathNot: spec },
    to: { path: '^db/repositories/', dependencyTypesNot: ['type-only'] },
  },
  {
    name: 'sql-lives-in-db',
    comment: 'Only db knows SQL. compose.ts hands the pool to the session store and the queue.',
    severity: 'error',
    from: { path: '.', pathNot: ['^(db|tools)/', '^backend/compose\\.ts$', '(^|/)node_modules/'] },
    to: { path: packages('kysely') },
  },
  {
    name: 'pool-lives-in-db',
    comment:
      'Only db opens connections; a db spec may, to try one wall alone or hold the session store.',
    severity: 'error',
    from: {
      path: '.',
      pathNot: [
        '^(db|tools)/',
        '^backend/compose\\.ts$',
        '(^|/)node_modules/',
        '\\.db\\.spec\\.ts$',
      ],
    },
    to: { path: packages('pg') },
  },
  {
    name: 'replies-at-the-edge',
    comment: 'Services return plain values; only the edge makes replies of them.',
    severity: 'error',
    from: { path: '-service\\.ts$' },
    to: { path: '-repl(y|ies)\\.ts$' },
  },
  {
    name: 'nobody-imports-tools',
    comment: 'Tools stand above everything.',
    severity: 'error',
    from: { pathNot: '^tools/' },
    to: { path: '^tools/' },
  },
  {
    name: 'production-imports-no-tests',
    comment: 'Specs and testing/ folders serve specs only.',
    severity: 'error',
    from: { pathNot: [spec, '-harness\\.ts$', '^(tools|e2e)/'] },
    to: { path: spec },
  },
  {
    name: 'pure-specs-stay-pure',
    comment: 'A spec of a pure folder knows that folder, files of reference values and test tools.',
    severity: 'error',
    from: { path: `^(${pureFolders.join('|')})/`, pathNot: '/testing/' },
    to: { path: '^(db|src|stubs|e2e)/|^backend/[^/]+\\.ts$' },
  },
  {
    name: 'backend-specs',
    comment:
      'Specs may build the whole backend and talk to a stub; screens are none of their business.',
    severity: 'error',
    from: { path: '^(backend|db|stubs)/', pathNot: '(^|/)node_modules/' },
    to: { path: '^(src|e2e)/' },
  },
  {
    name: 'door-only',
    comment: 'Index files stand at five doors only; elsewhere import the file.',
    severity: 'error',
    from: {},
    to: {
      path: [
        '^(backend|db|src|stubs|e2e|tools)/index\\.ts$',
        '^(backend|db|src|stubs|e2e|tools)/.*/index\\.ts$',
      ],
      pathNot: '^backend/(contract|stats|stats/prediction|figures|panel-data)/index\\.ts$',
    },
  },
  {
    name: 'no-unresolvable',
    comment: 'An import that leads nowhere.',
    severity: 'error',
    from: {},
    to: { couldNotResolve: true },
  },
  {
    name: 'listed-packages-only',
    comment:
      'A package must stand in package.json; one that merely happens to be there may vanish.',
    severity: 'error',
    from: { pathNot: '(^|/)node_modules/' },
    to: { dependencyTypes: ['npm-no-pkg', 'npm-unknown'] },
  },
];

module.exports = {
  forbidden: [...ofFolder, ...ofScreens, ...acrossFolders],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    combinedDependencies: false,
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'node', 'default', 'types'],
      extensions: ['.ts', '.mjs', '.js', '.cjs', '.json', '.d.ts'],
    },
  },
};
