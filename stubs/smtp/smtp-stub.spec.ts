import { createTransport, type Transporter } from 'nodemailer';
import { SmtpStubClient } from './testing/stub-client';

const to = 'cfo@velmara.example';

describe('the stub of a mail server', () => {
  let stub: SmtpStubClient;
  let transport: Transporter;

  beforeEach(async () => {
    stub = await SmtpStubClient.start();
    transport = createTransport({ url: stub.smtpUrl, greetingTimeout: 200, socketTimeout: 400 });
  });

  afterEach(async () => {
    transport.close();
    await stub.stop();
  });

  const send = (address = to, subject = 'Edition 3 · “naïve”') =>
    transport.sendMail({
      from: 'kinvale@velmara.example',
      to: address,
      subject,
      text: `Zoë published it.\n${'A long line. '.repeat(20)}\n.\nend`,
      html: '<p>Zoë <b>published</b> it. 100 %=3D</p>',
    });

  it('keeps what it takes, as a reader would see it', async () => {
    const { messageId } = await send();
    const [mail, ...others] = await stub.mailsTo(to.toUpperCase());
    expect(others).toEqual([]);
    expect(mail.subject).toBe('Edition 3 · “naïve”');
    expect(mail.text).toBe(`Zoë published it.\n${'A long line. '.repeat(20).trimEnd()} \n.\nend`);
    expect(mail.html).toBe('<p>Zoë <b>published</b> it. 100 %=3D</p>');
    expect(mail.messageId).toBe(messageId);
    expect(mail.recipients).toEqual([to]);
    expect(await stub.mailsTo('other@velmara.example')).toEqual([]);
  });

  it('reads a subject longer than a line, and one of plain letters', async () => {
    const long = `Édition ${'très longue '.repeat(12)}`.trim();
    await send(to, long);
    await send(to, 'Edition 4');
    expect((await stub.mailsTo(to)).map(({ subject }) => subject)).toEqual([long, 'Edition 4']);
  });

  it('keeps the newest 500, and nothing once it was cleared', async () => {
    const { Mailbox } = await import('./mailbox');
    const mailbox = new Mailbox();
    for (let number = 1; number <= 501; number++)
      mailbox.add({
        subject: String(number),
        from: '',
        to,
        messageId: '',
        text: '',
        html: '',
        sender: '',
        recipients: [to],
        source: '',
      });
    expect(mailbox.list().length).toBe(500);
    expect(mailbox.list(to)[0].subject).toBe('2');
    await send();
    expect((await fetch(`${stub.pageUrl}/api/mails`, { method: 'DELETE' })).status).toBe(204);
    expect(await stub.mailsTo(to)).toEqual([]);
  });

  it('puts off, refuses for good, refuses connections and falls silent when told to', async () => {
    await stub.fail({ greylist: 1, refused: ['gone@velmara.example'] });
    await expectAsync(send()).toBeRejectedWith(jasmine.objectContaining({ responseCode: 451 }));
    await expectAsync(send('gone@velmara.example')).toBeRejectedWith(
      jasmine.objectContaining({ responseCode: 550 }),
    );
    await expectAsync(send()).toBeResolved();
    await stub.fail({ refusesConnections: true });
    await expectAsync(send()).toBeRejectedWithError(/ECONNREFUSED/);
    await stub.fail({ refusesConnections: false, hangs: 'at-greeting' });
    await expectAsync(send()).toBeRejectedWithError(/Timeout|Greeting never received/);
    await stub.fail({ hangs: 'after-taking' });
    await expectAsync(send()).toBeRejectedWithError(/Timeout/);
    expect((await stub.mailsTo(to)).length)
      .withContext('taken, and not said')
      .toBe(2);
    await stub.fail({ hangs: 'never' });
    await expectAsync(send()).toBeResolved();
  });

  it('refuses faults that it does not know', async () => {
    await expectAsync(stub.fail({ greylist: -1 })).toBeRejectedWithError(/greylist/);
    await expectAsync(stub.fail({ hangs: 'often' as 'never' })).toBeRejectedWithError(/hangs/);
    await expectAsync(stub.fail({ slow: true } as object)).toBeRejectedWithError(/no fault slow/);
  });

  it('shows a mail on a page where nothing of it runs', async () => {
    await send(to, '<script>alert(1)</script>');
    const list = await (await fetch(stub.pageUrl)).text();
    expect(list).not.toContain('<script>');
    const path = /href="(\/mails\/[^"]+)"/.exec(list)?.[1] ?? '';
    const page = await (await fetch(stub.pageUrl + path)).text();
    expect(page).toContain('Zoë published it.');
    expect(page).toContain(`<iframe sandbox title="The mail as HTML" src="${path}/html">`);
    const html = await fetch(`${stub.pageUrl}${path}/html`);
    expect(html.headers.get('content-security-policy')).toBe("sandbox; default-src 'none'");
    expect(await html.text()).toContain('<b>published</b>');
    expect((await fetch(`${stub.pageUrl}/mails/none`)).status).toBe(404);
  });
});
