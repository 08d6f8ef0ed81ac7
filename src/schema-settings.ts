import * as z from 'zod';

// Zod tries `new Function` when a schema is first built, and the content security policy reports that as a violation.
// Listed as a polyfill in angular.json, so that it runs before any chunk that builds a schema.
z.config({ jitless: true });
