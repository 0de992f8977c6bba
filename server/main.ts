import { DEMO_PASSWORD, DEMO_SIGN_INS } from '#db/demo/sign-ins';
import { ROLE_TITLES } from '#shared/contract/roles';
import { type AddressInfo } from 'node:net';
import process from 'node:process';
import { createApp } from './app';
import { type Context } from './context';
import { type Environment, EnvironmentRefused, readEnvironment } from './environment';
import { firstAdminLink } from './sessions/open-site';
import { start } from './start';

/** How long requests under way may take to end after SIGTERM, in milliseconds. */
const PATIENCE = 5_000;

function say(text: string): void {
  process.stdout.write(`${text}\n`);
}

function signIns(): string {
  return DEMO_SIGN_INS.map(
    ({ email, roles }) => `  ${email.padEnd(32)}${roles.map((role) => ROLE_TITLES[role]).join(', ')}`,
  ).join('\n');
}

function greet(context: Context, address: string): void {
  say(`Quietrail is at ${address}`);
  if (context.environment.mode === 'demo') {
    say(`Demo. Everybody's password is ${DEMO_PASSWORD}\n${signIns()}`);
    return;
  }
  const link = firstAdminLink(context);
  if (link !== undefined) say(`Nobody has an account yet. Open this link once, within 72 hours:\n  ${link}`);
}

async function main(environment: Environment): Promise<void> {
  if (environment.mode === 'demo') say('Starting in demo mode.');
  const running = await start(environment, new URL('./', import.meta.url));
  const server = createApp(running.context).listen(environment.port, environment.host, () => {
    const { port } = server.address() as AddressInfo;
    greet(running.context, environment.publicUrl ?? `http://${environment.host}:${port}`);
  });
  server.on('error', (error) => {
    process.stderr.write(`Quietrail cannot listen on port ${environment.port}: ${error.message}\n`);
    process.exit(1);
  });

  let stopping = false;
  const stop = () => {
    if (stopping) return;
    stopping = true;
    running.context.stream.close();
    const cut = setTimeout(() => {
      server.closeAllConnections();
    }, PATIENCE);
    server.close(() => {
      clearTimeout(cut);
      void running.close().then(() => process.exit(0));
    });
    server.closeIdleConnections();
  };
  process.on('SIGTERM', stop);
  process.on('SIGINT', stop);
}

try {
  await main(readEnvironment(process.env, process.cwd()));
} catch (error) {
  if (!(error instanceof EnvironmentRefused)) throw error;
  process.stderr.write(`Quietrail does not start with these settings:\n${error.message}\n`);
  process.exit(1);
}
