// The stub of a mail server as a process of its own, for local use and tests. SMTP_STUB_PORT and
// SMTP_STUB_PAGE_PORT: ports on 127.0.0.1, 0 for a free one. What it takes stays in memory.
import { startSmtpStub } from './smtp-stub';

const { NODE_ENV, SMTP_STUB_IN_TESTS } = process.env;

if (NODE_ENV === 'production' && SMTP_STUB_IN_TESTS !== '1') {
  console.error('The stub of a mail server does not start with NODE_ENV=production.');
  process.exit(1);
}

function portOf(name: string): number {
  const port = Number(process.env[name] ?? '0');
  if (Number.isInteger(port) && port >= 0 && port <= 65_535) return port;
  console.error(`expected a port number in ${name}; found ${process.env[name]}`);
  process.exit(1);
}

const stub = await startSmtpStub({
  smtp: portOf('SMTP_STUB_PORT'),
  page: portOf('SMTP_STUB_PAGE_PORT'),
}).catch((error: unknown) => {
  console.error(`The stub of a mail server cannot listen on 127.0.0.1: ${String(error)}`);
  process.exit(1);
});
console.log(JSON.stringify({ listening: stub.smtpUrl, page: stub.pageUrl }));
for (const signal of ['SIGTERM', 'SIGINT'] as const) {
  process.once(signal, () => {
    void stub.stop().then(() => process.exit(0));
  });
}
