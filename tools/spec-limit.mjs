/** The longest that a spec may take, as run-specs.mjs set it; a helper, since specs may run in several processes. */
globalThis.jasmine.DEFAULT_TIMEOUT_INTERVAL = Number(process.env.KINVALE_SPEC_LIMIT_MS);
