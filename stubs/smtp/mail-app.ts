import express, { type Express, type NextFunction, type Request, type Response } from 'express';
import { listPage, mailPage } from './mail-page';
import type { CapturedMail, Mailbox } from './mailbox';
import type { SmtpListener } from './smtp-listener';

/**
 * Pages to read what was sent, and for tests: `GET /api/mails?to=`, `DELETE /api/mails`, `GET` and `PUT /api/faults`.
 */
export function createMailApp(mailbox: Mailbox, listener: SmtpListener): Express {
  const app = express();
  app.disable('x-powered-by').disable('etag');
  app.use(onlyHere);
  app.use(express.json());
  app.get('/', (_request, response) => {
    response.type('html').send(listPage(mailbox.list()));
  });
  app.get('/mails/:id', (request, response) => {
    withMail(mailbox, request, response, (mail) => response.type('html').send(mailPage(mail)));
  });
  app.get('/mails/:id/html', (request, response) => {
    response.set('Content-Security-Policy', "sandbox; default-src 'none'");
    withMail(mailbox, request, response, (mail) => response.type('html').send(mail.html));
  });
  app.get('/api/mails', (request, response) => {
    const { to } = request.query;
    response.json({ mails: mailbox.list(typeof to === 'string' ? to : undefined) });
  });
  app.delete('/api/mails', (_request, response) => {
    mailbox.clear();
    response.status(204).end();
  });
  app.get('/api/faults', (_request, response) => {
    response.json(listener.faults);
  });
  app.put('/api/faults', async (request, response) => {
    await listener.change(request.body);
    response.json(listener.faults);
  });
  app.use(sendFailure);
  return app;
}

/** Another name for this machine in the address is a foreign page's: mails may hold links that open accounts. */
function onlyHere(request: Request, response: Response, next: NextFunction): void {
  if (request.hostname === '127.0.0.1' || request.hostname === 'localhost') next();
  else response.status(403).send('This page answers to 127.0.0.1 alone.');
}

function withMail(
  mailbox: Mailbox,
  request: Request,
  response: Response,
  show: (mail: CapturedMail) => void,
): void {
  const mail = mailbox.find(String(request.params['id']));
  if (mail === undefined) response.status(404).send('There is no such mail any more.');
  else show(mail);
}

/** Express knows an error handler by its four parameters. */
function sendFailure(error: unknown, _request: Request, response: Response, _next: NextFunction) {
  if (error instanceof TypeError || error instanceof SyntaxError) {
    response.status(400).json({ error: error.message });
    return;
  }
  console.error(error);
  response.status(500).json({ error: String(error) });
}
