import { auditEntries } from '#db/schema/audit';
import { people } from '#db/schema/people';
import { refreshTokens } from '#db/schema/sessions';
import { eq } from 'drizzle-orm';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { sentBack, setCookie } from '../support/cookies';
import { PASSWORD } from '../support/test-people';
import { testSite, type TestSite } from '../support/test-site';

let site: TestSite;
beforeEach(async () => {
  site = await testSite();
});
afterEach(() => site.close());

function signIn(email: string, password: string, keep = false) {
  return site.nobody().post('/api/session').send({ email, password, keep });
}
function refresh(cookie: string) {
  return site.nobody().post('/api/session/refresh').set('cookie', cookie);
}
const QUALITY = 'quality@hollowmere.example';

describe('signing in', () => {
  it('tells who is signed in', async () => {
    const agent = await site.signIn('quality');
    const answer = await agent.get('/api/session').expect(200);
    expect(answer.body).toMatchObject({ email: QUALITY, roles: ['quality'], stampNumber: '7' });
  });

  it('takes the address in capitals too', async () => {
    await signIn('QUALITY@Hollowmere.example', PASSWORD).expect(200);
  });

  it('answers an unknown person, a wrong password and an inactive account alike', async () => {
    site.db.update(people).set({ active: false }).where(eq(people.email, 'auditor@hollowmere.example')).run();
    const answers = [
      await signIn('nobody@hollowmere.example', PASSWORD).expect(401),
      await signIn(QUALITY, 'a wrong long password').expect(401),
      await signIn('auditor@hollowmere.example', PASSWORD).expect(401),
    ];
    expect(new Set(answers.map((answer) => answer.text)).size).toBe(1);
    expect(answers[0]?.body).toMatchObject({ code: 'sign-in-refused' });
  });

  it('puts sign-ins and refusals on record, never the password', async () => {
    await signIn(QUALITY, 'a wrong long password');
    await signIn(QUALITY, PASSWORD);
    const entries = site.db.select().from(auditEntries).all();
    expect(entries.map(({ action, after }) => [action, after])).toEqual([
      ['sign-in-refused', `{"email":"${QUALITY}","why":"wrong-password"}`],
      ['signed-in', '{"keep":false}'],
    ]);
    expect(JSON.stringify(entries)).not.toContain('a wrong long password');
  });

  it('keeps the session in cookies that no script reads and no other site sends', async () => {
    const answer = await signIn(QUALITY, PASSWORD);
    for (const [name, path] of [
      ['qr_access', '/'],
      ['qr_refresh', '/api/session'],
    ] as const) {
      const line = setCookie(answer, name);
      expect(line).toContain('HttpOnly');
      expect(line).toContain('SameSite=Strict');
      expect(line).toMatch(new RegExp(`Path=${path}(;|$)`));
      expect(line).not.toMatch(/Expires|Max-Age/);
    }
  });

  it('keeps them beyond the browser window when asked to', async () => {
    const answer = await signIn(QUALITY, PASSWORD, true);
    expect(setCookie(answer, 'qr_refresh')).toContain('Expires=Thu, 12 Mar 2026 20:00:00 GMT');
  });

  it('sends them over TLS only where the site is reached by it', async () => {
    site.close();
    site = await testSite({ publicUrl: 'https://quietrail.hollowmere.example' });
    expect(setCookie(await signIn(QUALITY, PASSWORD), 'qr_access')).toContain('Secure');
  });

  it('keeps only the hash of a refresh token', async () => {
    const answer = await signIn(QUALITY, PASSWORD);
    const token = sentBack(answer, 'qr_refresh').replace('qr_refresh=', '');
    const kept = site.db.select().from(refreshTokens).all();
    expect(kept).toHaveLength(1);
    expect(JSON.stringify(kept)).not.toContain(token);
  });
});

describe('too many attempts', () => {
  it('are stopped for one account from one address, even with the right password', async () => {
    site.close();
    site = await testSite({ signInAttempts: 3 });
    for (let attempt = 0; attempt < 3; attempt += 1) await signIn(QUALITY, 'a wrong long password').expect(401);
    const answer = await signIn(QUALITY, PASSWORD).expect(429);
    expect(answer.body).toMatchObject({ code: 'too-many-attempts' });
    expect(Number(answer.headers['retry-after'])).toBeGreaterThan(0);
    await signIn('auditor@hollowmere.example', PASSWORD).expect(200);
  });

  it('do not count those that succeed', async () => {
    site.close();
    site = await testSite({ signInAttempts: 2 });
    for (let attempt = 0; attempt < 5; attempt += 1) await signIn(QUALITY, PASSWORD).expect(200);
  });

  it('are stopped at a change of password as well', async () => {
    site.close();
    site = await testSite({ signInAttempts: 2 });
    const agent = await site.signIn('quality');
    const body = { password: 'a wrong long password', newPassword: 'another plain long password' };
    for (let attempt = 0; attempt < 2; attempt += 1) await agent.put('/api/session/password').send(body).expect(422);
    await agent.put('/api/session/password').send(body).expect(429);
  });
});

describe('a session', () => {
  it('is over for the access token after ten minutes, and goes on with the refresh token', async () => {
    const agent = await site.signIn('quality');
    site.clock.advance({ minutes: 11 });
    await agent.get('/api/session').expect(401);
    await agent.post('/api/session/refresh').expect(200);
    await agent.get('/api/session').expect(200);
  });

  it.each([
    [false, 8],
    [true, 12],
  ])('ends when it is kept: %s after %i hours, however often it is refreshed', async (keep, hours) => {
    let answer = await signIn(QUALITY, PASSWORD, keep);
    for (let hour = 1; hour < hours; hour += 1) {
      site.clock.advance({ hours: 1 });
      answer = await refresh(sentBack(answer, 'qr_refresh')).expect(200);
    }
    site.clock.advance({ hours: 1 });
    const late = await refresh(sentBack(answer, 'qr_refresh')).expect(401);
    expect(late.body).toMatchObject({ code: 'session-ended' });
    expect(setCookie(late, 'qr_refresh')).toContain('Expires=Thu, 01 Jan 1970');
  });

  it('ends for both holders when a refresh token is used twice', async () => {
    const first = await signIn(QUALITY, PASSWORD);
    const stolen = sentBack(first, 'qr_refresh');
    const second = await refresh(stolen).expect(200);
    const replay = await refresh(stolen).expect(401);
    expect(replay.body).toMatchObject({ code: 'session-ended' });
    await refresh(sentBack(second, 'qr_refresh')).expect(401);
    await site.nobody().get('/api/session').set('cookie', sentBack(second, 'qr_access')).expect(401);
    const actions = site.db.select({ action: auditEntries.action, after: auditEntries.after }).from(auditEntries).all();
    expect(actions.at(-1)).toEqual({ action: 'session-ended', after: '{"why":"refresh-token-used-twice"}' });
  });

  it('is not refreshed by what the server never gave out', async () => {
    await site.nobody().post('/api/session/refresh').expect(401);
    await refresh('qr_refresh=made-up').expect(401);
  });

  it('ends at once when the person signs out, on this device only', async () => {
    const here = await site.signIn('quality');
    const there = await site.signIn('quality');
    const stolen = await signIn(QUALITY, PASSWORD);
    await here.delete('/api/session').expect(200);
    await here.get('/api/session').expect(401);
    await there.get('/api/session').expect(200);
    const out = await site.nobody().delete('/api/session').set('cookie', sentBack(stolen, 'qr_refresh')).expect(200);
    expect(setCookie(out, 'qr_access')).toContain('Expires=Thu, 01 Jan 1970');
    await site.nobody().get('/api/session').set('cookie', sentBack(stolen, 'qr_access')).expect(401);
  });

  it('is not made by a token that somebody else signed, or that says it needs no signature', async () => {
    const claims = Buffer.from('{"session":"x","exp":9999999999}').toString('base64url');
    const unsigned = `${Buffer.from('{"alg":"none"}').toString('base64url')}.${claims}.`;
    const signed = `${Buffer.from('{"alg":"HS256"}').toString('base64url')}.${claims}.${'A'.repeat(43)}`;
    for (const token of [unsigned, signed, 'rubbish'])
      await site.nobody().get('/api/session').set('cookie', `qr_access=${token}`).expect(401);
  });
});

describe('changing the own password', () => {
  const body = { password: PASSWORD, newPassword: 'another plain long password' };

  it('ends every other session of the person', async () => {
    const here = await site.signIn('quality');
    const there = await site.signIn('quality');
    await here.put('/api/session/password').send(body).expect(200);
    await here.get('/api/session').expect(200);
    await there.get('/api/session').expect(401);
    await signIn(QUALITY, PASSWORD).expect(401);
    await signIn(QUALITY, body.newPassword).expect(200);
  });

  it('asks for the password the person has now', async () => {
    const agent = await site.signIn('quality');
    const wrong = { ...body, password: 'a wrong long password' };
    const answer = await agent.put('/api/session/password').send(wrong).expect(422);
    expect(answer.body).toMatchObject({ code: 'wrong-password', errors: [{ path: ['password'] }] });
  });

  it('asks for another one, and for length', async () => {
    const agent = await site.signIn('quality');
    await agent
      .put('/api/session/password')
      .send({ ...body, newPassword: PASSWORD })
      .expect(422);
    const short = await agent
      .put('/api/session/password')
      .send({ ...body, newPassword: 'short' })
      .expect(400);
    expect(short.body).toMatchObject({ errors: [{ path: ['newPassword'] }] });
  });
});

describe('a request that changes something', () => {
  it.each([
    ['origin', 'https://elsewhere.example'],
    ['origin', 'null'],
    ['sec-fetch-site', 'cross-site'],
    ['sec-fetch-site', 'same-site'],
  ])('is refused when its %s is %s', async (header, value) => {
    const agent = await site.signIn('quality');
    const answer = await agent.post('/api/suppliers').set(header, value).send({}).expect(403);
    expect(answer.body).toMatchObject({ code: 'cross-site' });
  });

  it('is taken from the own page, and from a program that is no browser', async () => {
    const agent = await site.signIn('quality');
    await agent
      .post('/api/suppliers')
      .set('host', 'bench:3000')
      .set('origin', 'http://bench:3000')
      .send({})
      .expect(400);
    await agent.post('/api/suppliers').set('sec-fetch-site', 'same-origin').send({}).expect(400);
    await agent.post('/api/suppliers').send({}).expect(400);
  });

  it('must come from the public address where one is set', async () => {
    site.close();
    site = await testSite({ publicUrl: 'http://quietrail.hollowmere.example' });
    const agent = site.as('quality');
    await agent.post('/api/suppliers').set('origin', 'http://quietrail.hollowmere.example').send({}).expect(400);
    await agent.post('/api/suppliers').set('host', 'other').set('origin', 'http://other').send({}).expect(403);
  });

  it('may be read from anywhere: the cookie does not come along', async () => {
    await site.nobody().get('/api/front').set('origin', 'https://elsewhere.example').expect(200);
  });
});
