import { type Context } from '#server/context';
import { type Outbox, startOutbox } from '#server/mail/outbox';
import { startSmtpFake } from '#server/mail/smtp-fake';
import { smtpTransport } from '#server/mail/transport';
import { type DemoClock } from './demo-clock';

/** An outbox on the demo's clock. What it sends goes to a mail server of our own, whatever server the site is set to. */
export async function startDemoMail({ db, log, environment }: Context, clock: DemoClock): Promise<Outbox> {
  const fake = await startSmtpFake({ db, clock, log });
  const transport = smtpTransport(fake.url);
  const outbox = startOutbox({ db, clock, log, transport, from: environment.mailFrom });
  return {
    wake: () => outbox.wake(),
    idle: () => outbox.idle(),
    close: async () => {
      await outbox.close();
      await fake.close();
    },
  };
}
