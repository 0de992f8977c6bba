import { createTransport } from 'nodemailer';

/** A message as it goes over the wire. */
export interface Letter {
  messageId: string;
  from: string;
  to: readonly string[];
  subject: string;
  html: string;
  text: string;
  date: Date;
}

/** What came of one attempt to hand a letter over. */
export interface Delivery {
  /** Recipients the server took the letter for. */
  taken: readonly string[];
  /** Whether the others are worth another try; a server that answers 5xx to them will not change its mind. */
  worthRetrying: boolean;
  /** What the server said, or why it was not reached. */
  words: string;
}

export interface MailTransport {
  /** Hands a letter over for some of its recipients; a failure is a delivery to nobody, never an exception. */
  send(letter: Letter, recipients: readonly string[]): Promise<Delivery>;
  close(): void;
}

/** A refusal as nodemailer reports it. */
interface SmtpError {
  message: string;
  code?: string;
  response?: string;
  responseCode?: number;
  recipient?: string;
}

/** A server that hangs is given up after this long, in milliseconds. */
const PATIENCE = 20_000;

const wordsOf = (error: SmtpError) => error.response ?? error.message;

/** Only an answer to the letter itself is final; a refused sign-in is a setting that someone can mend. */
function isPermanent(error: SmtpError): boolean {
  const aboutTheLetter = error.code === 'EENVELOPE' || error.code === 'EMESSAGE';
  return aboutTheLetter && error.responseCode !== undefined && error.responseCode >= 500;
}

function asSmtpError(error: unknown): SmtpError {
  return error instanceof Error ? error : { message: String(error) };
}

/** Told for each recipient by name when only some were taken. */
function wordsOfPart(taken: readonly string[], refusals: readonly SmtpError[]): string {
  const refused = refusals.map((refusal) => `${refusal.recipient ?? 'A recipient'}: ${wordsOf(refusal)}`);
  return `Taken for ${taken.join(', ')}. Refused for ${refused.join('; ')}`;
}

/** Sends by SMTP; the URL is smtp:// or smtps://, with user and password where the server wants them. */
export function smtpTransport(url: string, patience = PATIENCE): MailTransport {
  const transporter = createTransport({
    url,
    connectionTimeout: patience,
    greetingTimeout: patience,
    socketTimeout: patience,
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  return {
    async send(letter, recipients) {
      try {
        const told = await transporter.sendMail({
          ...letter,
          to: [...letter.to],
          envelope: { from: letter.from, to: [...recipients] },
          headers: { 'Auto-Submitted': 'auto-generated' },
        });
        const refusals: SmtpError[] = told.rejectedErrors ?? [];
        if (refusals.length === 0) return { taken: recipients, worthRetrying: false, words: told.response };
        const taken = recipients.filter((recipient) => !told.rejected.includes(recipient));
        const worthRetrying = refusals.some((refusal) => !isPermanent(refusal));
        return { taken, worthRetrying, words: wordsOfPart(taken, refusals) };
      } catch (thrown) {
        const error = asSmtpError(thrown);
        return { taken: [], worthRetrying: !isPermanent(error), words: wordsOf(error) };
      }
    },
    close: () => transporter.close(),
  };
}
