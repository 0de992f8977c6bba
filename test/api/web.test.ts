import { mkdtempSync, mkdirSync, rmSync, writeFileSync, copyFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { brotliCompressSync } from 'node:zlib';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { testSite, type TestSite } from '../support/test-site';

describe('the one port', () => {
  let site: TestSite;
  let root: string;
  beforeAll(async () => {
    root = mkdtempSync(path.join(tmpdir(), 'quietrail-'));
    const app = path.join(root, 'dist', 'app');
    mkdirSync(path.join(app, 'media'), { recursive: true });
    writeFileSync(path.join(app, 'index.html'), '<!doctype html><title>Quietrail</title>');
    writeFileSync(path.join(app, 'main-ABCD1234.js'), 'export {};');
    writeFileSync(path.join(app, 'main-ABCD1234.js.br'), brotliCompressSync('export {};'));
    writeFileSync(path.join(app, 'icon.svg'), '<svg xmlns="http://www.w3.org/2000/svg"/>');
    copyFileSync(new URL('../../package.json', import.meta.url), path.join(root, 'package.json'));
    site = await testSite({ root });
  });
  afterAll(() => {
    site.close();
    rmSync(root, { recursive: true });
  });

  const open = (address: string) => site.nobody().get(address).set('accept', 'text/html,*/*;q=0.8');

  it.each(['/', '/lots/12', '/link', '/sign-in?from=%2Flots'])(
    'opens the application at %s, fresh',
    async (address) => {
      const answer = await open(address).expect(200);
      expect(answer.text).toContain('<title>Quietrail</title>');
      expect(answer.headers['cache-control']).toBe('no-store');
    },
  );

  it('lets browsers keep files whose name changes with their content', async () => {
    const script = await site.nobody().get('/main-ABCD1234.js').expect(200);
    expect(script.headers['cache-control']).toBe('public, max-age=31536000, immutable');
    const icon = await site.nobody().get('/icon.svg').expect(200);
    expect(icon.headers['cache-control']).toBe('no-cache');
  });

  it('sends the compressed file to browsers that take it', async () => {
    const script = await site.nobody().get('/main-ABCD1234.js').set('accept-encoding', 'gzip, br').expect(200);
    expect(script.text).toBe('export {};');
    expect(script.headers).toMatchObject({
      'content-encoding': 'br',
      'content-type': 'text/javascript; charset=utf-8',
      'cache-control': 'public, max-age=31536000, immutable',
      vary: expect.stringMatching(/accept-encoding/i),
    });
    const plain = await site.nobody().get('/main-ABCD1234.js').set('accept-encoding', 'gzip').expect(200);
    expect(plain.headers['content-encoding']).not.toBe('br');
    expect(plain.text).toBe('export {};');
  });

  it.each(['/missing.js', '/main-00000000.js', '/../package.json', '/%2e%2e/package.json'])(
    'has no file at %s',
    async (address) => {
      const answer = await open(address).expect(404);
      expect(answer.body).toMatchObject({ code: 'not-found' });
    },
  );

  it('says that it is well', async () => {
    expect((await site.nobody().get('/health').expect(200)).body).toEqual({ healthy: true });
  });

  it('allows scripts of its own only, and no frame elsewhere', async () => {
    const { headers } = await open('/').expect(200);
    expect(headers['content-security-policy']).toBe(
      "default-src 'self';script-src 'self';style-src 'self' 'unsafe-inline';img-src 'self' data: blob:;font-src 'self';" +
        "connect-src 'self';object-src 'none';frame-src 'self' blob:;frame-ancestors 'self';base-uri 'self';form-action 'self'",
    );
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['x-powered-by']).toBeUndefined();
    expect(headers['strict-transport-security']).toBeUndefined();
  });

  it('asks for TLS where it is reached by it', async () => {
    const secure = await testSite({ publicUrl: 'https://quietrail.hollowmere.example' });
    const { headers } = await secure.nobody().get('/health').expect(200);
    expect(headers['strict-transport-security']).toBeDefined();
    expect(headers['content-security-policy']).toContain('upgrade-insecure-requests');
    secure.close();
  });

  it('never lets an answer of the interface be kept', async () => {
    const answer = await site.nobody().get('/api/front').expect(200);
    expect(answer.headers['cache-control']).toBe('no-store');
  });
});

it('says so when the application was not built', async () => {
  const root = mkdtempSync(path.join(tmpdir(), 'quietrail-'));
  copyFileSync(new URL('../../package.json', import.meta.url), path.join(root, 'package.json'));
  const site = await testSite({ root });
  const answer = await site.nobody().get('/').set('accept', 'text/html').expect(404);
  expect(answer.body).toMatchObject({ code: 'not-found' });
  site.close();
  rmSync(root, { recursive: true });
});
