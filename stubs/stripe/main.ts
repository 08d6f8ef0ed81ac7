// The stub of Stripe as a process of its own, for local use and tests. STRIPE_STUB_PORT: port on
// 127.0.0.1, 0 for a free one. STRIPE_STUB_STATE: file that keeps its state, memory if absent.
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { createStripeStub } from './stripe-stub';

const { NODE_ENV, STRIPE_STUB_IN_TESTS, STRIPE_STUB_PORT, STRIPE_STUB_STATE } = process.env;

if (NODE_ENV === 'production' && STRIPE_STUB_IN_TESTS !== '1') {
  console.error('The stub of Stripe does not start with NODE_ENV=production.');
  process.exit(1);
}
const port = Number(STRIPE_STUB_PORT ?? '0');
if (!Number.isInteger(port) || port < 0 || port > 65_535) {
  console.error(`expected a port number in STRIPE_STUB_PORT; found ${STRIPE_STUB_PORT}`);
  process.exit(1);
}

const server = createServer(
  createStripeStub({ statePath: STRIPE_STUB_STATE === '' ? undefined : STRIPE_STUB_STATE }),
);
server.on('error', (error) => {
  console.error(`The stub of Stripe cannot listen on 127.0.0.1:${port}: ${error.message}`);
  process.exit(1);
});
server.listen(port, '127.0.0.1', () => {
  const address = server.address() as AddressInfo;
  console.log(JSON.stringify({ listening: `http://127.0.0.1:${address.port}` }));
});
for (const signal of ['SIGTERM', 'SIGINT'] as const) {
  process.once(signal, () => {
    server.close(() => process.exit(0));
    server.closeAllConnections();
  });
}
