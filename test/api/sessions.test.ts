import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { testSite, type TestSite } from '../support/test-site';

describe('signing in', () => {
  let site: TestSite;
  beforeEach(async () => {
    site = await testSite();
  });
  afterEach(() => site.close());

  it('tells who is signed in', async () => {
    const agent = await site.signIn('quality');
    const answer = await agent.get('/api/session').expect(200);
    expect(answer.body).toMatchObject({ email: 'quality@hollowmere.example', roles: ['quality'], stampNumber: '7' });
  });
});
