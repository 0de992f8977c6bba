import { EnvironmentRefused, readEnvironment } from '#server/environment';
import { describe, expect, it } from 'vitest';

const PRODUCTION = {
  QUIETRAIL_MODE: 'production',
  QUIETRAIL_SECRET: 'a secret of the site, long enough to sign with',
  PUBLIC_URL: 'https://inspection.example',
  SMTP_URL: 'smtps://mail.example:465',
  MAIL_FROM: 'Incoming inspection <inspection@site.example>',
};

function refusal(variables: Record<string, string | undefined>): string {
  try {
    readEnvironment(variables, '/srv/quietrail');
  } catch (error) {
    if (error instanceof EnvironmentRefused) return error.message;
    throw error;
  }
  return '';
}

describe('the settings', () => {
  it('are complete without a single variable: a demo on the loopback interface', () => {
    expect(readEnvironment({}, '/srv/quietrail')).toMatchObject({
      mode: 'demo',
      host: '127.0.0.1',
      port: 3000,
      dataFolder: '/srv/quietrail/data',
      smtpUrl: undefined,
    });
  });

  it('let production start on its own secret, address and mail server', () => {
    expect(readEnvironment(PRODUCTION, '/srv/quietrail').mode).toBe('production');
  });

  it.each([
    ['QUIETRAIL_SECRET', undefined],
    ['QUIETRAIL_SECRET', 'demo-secret-that-production-refuses'],
    ['QUIETRAIL_SECRET', 'short'],
    ['PUBLIC_URL', undefined],
    ['SMTP_URL', undefined],
    ['SMTP_URL', 'http://mail.example'],
    ['MAIL_FROM', undefined],
    ['PASSWORD_COST', '8'],
  ])('refuse production with %s %s, by name', (name, value) => {
    expect(refusal({ ...PRODUCTION, [name]: value })).toMatch(new RegExp(`^${name}: `));
  });

  it('name every fault at once', () => {
    expect(refusal({ PORT: 'eighty', LOG_LEVEL: 'loud' }).split('\n')).toHaveLength(2);
    expect(refusal({ QUIETRAIL_MODE: 'production' }).split('\n')).toHaveLength(4);
  });
});
