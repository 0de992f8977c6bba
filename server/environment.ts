import path from 'node:path';
import * as z from 'zod';

const DEMO_SECRET = 'demo-secret-that-production-refuses';
const DEMO_SENDER = 'Quietrail <quietrail@hollowmere.example>';

const schema = z
  .object({
    QUIETRAIL_MODE: z.enum(['demo', 'production']).default('demo'),
    HOST: z.string().default('127.0.0.1'),
    PORT: z.coerce.number().int().min(0).max(65535).default(3000),
    QUIETRAIL_DATA: z.string().default('data'),
    QUIETRAIL_SECRET: z.string().default(DEMO_SECRET),
    PUBLIC_URL: z.url().optional(),
    TRUST_PROXY: z.coerce.number().int().min(0).max(10).default(0),
    SMTP_URL: z.url({ protocol: /^smtps?$/ }).optional(),
    MAIL_FROM: z.string().default(DEMO_SENDER),
    LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('warn'),
    PASSWORD_COST: z.coerce.number().int().min(4).max(15).default(12),
    SIGN_IN_ATTEMPTS: z.coerce.number().int().min(1).default(10),
  })
  .superRefine((given, context) => {
    if (given.QUIETRAIL_MODE !== 'production') return;
    const refuse = (name: string, message: string) => context.addIssue({ code: 'custom', path: [name], message });
    if (given.QUIETRAIL_SECRET === DEMO_SECRET || given.QUIETRAIL_SECRET.length < 32)
      refuse('QUIETRAIL_SECRET', 'Production needs a secret of its own, at least 32 characters.');
    if (given.PASSWORD_COST < 12) refuse('PASSWORD_COST', 'Production hashes passwords at cost 12 or more.');
    if (!given.PUBLIC_URL) refuse('PUBLIC_URL', 'Production needs the address under which people reach it.');
    if (given.MAIL_FROM === DEMO_SENDER) refuse('MAIL_FROM', 'Production needs the sender of its letters.');
    if (!given.SMTP_URL) refuse('SMTP_URL', 'Production needs a mail server (smtp:// or smtps://).');
  });

/** The program's settings, read once from the environment. */
export interface Environment {
  mode: 'demo' | 'production';
  host: string;
  port: number;
  /** Folder of the database and of what the program keeps. */
  dataFolder: string;
  root: string;
  secret: string;
  publicUrl: string | undefined;
  trustProxy: number;
  smtpUrl: string | undefined;
  mailFrom: string;
  logLevel: string;
  passwordCost: number;
  signInAttempts: number;
}

/** Settings the program cannot start with; the message lists each by name. */
export class EnvironmentRefused extends Error {}

/** @throws {EnvironmentRefused} when a setting is missing or wrong */
export function readEnvironment(variables: Record<string, string | undefined>, root: string): Environment {
  const read = schema.safeParse(variables);
  if (!read.success)
    throw new EnvironmentRefused(
      read.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`).join('\n'),
    );
  const given = read.data;
  return {
    mode: given.QUIETRAIL_MODE,
    host: given.HOST,
    port: given.PORT,
    dataFolder: path.resolve(root, given.QUIETRAIL_DATA),
    root,
    secret: given.QUIETRAIL_SECRET,
    publicUrl: given.PUBLIC_URL,
    trustProxy: given.TRUST_PROXY,
    smtpUrl: given.SMTP_URL,
    mailFrom: given.MAIL_FROM,
    logLevel: given.LOG_LEVEL,
    passwordCost: given.PASSWORD_COST,
    signInAttempts: given.SIGN_IN_ATTEMPTS,
  };
}
