import { type Database } from '#db/open-database';
import { receivedMessages } from '#db/schema/mail';
import { type Clock } from '#server/clock';
import { simpleParser } from 'mailparser';
import { once } from 'node:events';
import { type Logger } from 'pino';
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from 'smtp-server';

export interface SmtpFake {
  /** Where it listens, as smtp://127.0.0.1:port. */
  url: string;
  close(): Promise<void>;
}

const LARGEST = 25_000_000;

interface Needs {
  db: Database;
  clock: Clock;
  log: Logger;
}

async function keepReceived(needs: Needs, stream: SMTPServerDataStream, session: SMTPServerSession): Promise<number> {
  const parsed = await simpleParser(stream, { skipHtmlToText: true, skipTextToHtml: true });
  const { mailFrom, rcptTo } = session.envelope;
  const { id } = needs.db
    .insert(receivedMessages)
    .values({
      messageId: parsed.messageId ?? '',
      sender: parsed.from?.text ?? (mailFrom ? mailFrom.address : ''),
      recipients: rcptTo.map((recipient) => recipient.address),
      subject: parsed.subject ?? '',
      html: parsed.html || '',
      text: parsed.text ?? '',
      receivedAt: needs.clock.now().toISOString(),
    })
    .returning({ id: receivedMessages.id })
    .get();
  return id;
}

/** Starts a mail server of our own that keeps what it is given and passes nothing on; it listens on this machine only. */
export async function startSmtpFake(needs: Needs): Promise<SmtpFake> {
  const server = new SMTPServer({
    banner: 'Quietrail keeps this mail and passes nothing on',
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    size: LARGEST,
    closeTimeout: 500,
    onData(stream, session, callback) {
      keepReceived(needs, stream, session).then(
        (id) => callback(null, `Kept as message ${id}`),
        (error: unknown) => {
          needs.log.error({ err: error }, 'a received message could not be kept');
          callback(new Error('The message could not be kept'));
        },
      );
    },
  });
  server.on('error', (error: Error) => needs.log.warn({ err: error }, 'a session with the local mail server broke'));
  const listener = server.listen(0, '127.0.0.1');
  await once(listener, 'listening');
  const address = listener.address();
  if (address === null || typeof address === 'string') throw new Error('The local mail server has no port.');
  return {
    url: `smtp://127.0.0.1:${address.port}`,
    close: () => new Promise((resolve) => server.close(() => resolve())),
  };
}
