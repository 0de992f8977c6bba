import { auditEntries } from '#db/schema/audit';
import { site as siteTable } from '#db/schema/site';
import { type Plan, type RevisionBody } from '#shared/contract/plans';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { buildPart, buildPlan } from '../support/builders';
import { computed, measured, revisionBody } from '../support/plan-bodies';
import { addTestPerson } from '../support/test-people';
import { type Agent, testSite, type TestSite } from '../support/test-site';

let site: TestSite;
let author: Agent;
let colleague: Agent;
beforeEach(async () => {
  site = await testSite();
  author = site.as('quality');
  const second = { name: 'Qadir Second', email: 'second@hollowmere.example', roles: ['quality'] } as const;
  colleague = site.as(await addTestPerson(site.db, second));
});
afterEach(() => site.close());

async function start(content: RevisionBody = revisionBody()): Promise<Plan> {
  const { id } = buildPart(site.db);
  return (await author.post('/api/plans').send({ partId: id, content }).expect(201)).body as Plan;
}

/** One step of a revision's life, named by its address, on the version that the plan shows. */
function step(agent: Agent, plan: Plan, name: 'submission' | 'return' | 'approval', body?: object) {
  const [newest] = plan.revisions;
  const request = agent
    .post(`/api/plans/${plan.id}/revisions/${newest?.revision}/${name}`)
    .set('if-match', `"${newest?.version}"`);
  return body ? request.send(body) : request;
}
function change(agent: Agent, plan: Plan, body: RevisionBody) {
  const [newest] = plan.revisions;
  return agent
    .put(`/api/plans/${plan.id}/revisions/${newest?.revision}`)
    .set('if-match', `"${newest?.version}"`)
    .send(body);
}
async function approved(): Promise<Plan> {
  const submitted = (await step(author, await start(), 'submission').expect(200)).body as Plan;
  return (await step(colleague, submitted, 'approval').expect(200)).body as Plan;
}

describe('the life of a plan', () => {
  it('starts with a draft of its part, under the next number', async () => {
    const plan = await start();
    expect(plan).toMatchObject({
      number: 'P-001',
      part: { number: 'HC-2402' },
      effectiveRevision: null,
      openRevision: { revision: 1, status: 'draft' },
      characteristics: 5,
      revisions: [{ ...revisionBody(), status: 'draft', author: site.people.quality.name, approver: null, version: 1 }],
    });
    const part = buildPart(site.db, { number: 'HC-2403' });
    const next = await author.post('/api/plans').send({ partId: part.id, content: revisionBody() }).expect(201);
    expect(next.body).toMatchObject({ number: 'P-002' });
  });

  it('goes from draft through review to effective', async () => {
    const plan = await approved();
    expect(plan).toMatchObject({
      effectiveRevision: 1,
      openRevision: null,
      revisions: [{ status: 'effective', approver: 'Qadir Second' }],
    });
    const part = (await author.get(`/api/parts/${plan.part.id}`)).body as { plan: unknown };
    expect(part.plan).toEqual({ id: plan.id, number: 'P-001', effectiveRevision: 1 });
  });

  it('retires the earlier revision when the next becomes effective', async () => {
    const first = await approved();
    const copy = (await author.post(`/api/plans/${first.id}/revisions`).expect(201)).body as Plan;
    expect(copy.revisions[0]).toMatchObject({ revision: 2, status: 'draft', changeNote: '' });
    expect(copy.revisions[0]?.characteristics).toEqual(first.revisions[0]?.characteristics);
    const submitted = (await step(author, copy, 'submission').expect(200)).body as Plan;
    const second = (await step(colleague, submitted, 'approval').expect(200)).body as Plan;
    expect(second.revisions.map(({ revision, status }) => [revision, status])).toEqual([
      [2, 'effective'],
      [1, 'retired'],
    ]);
    expect(second.revisions[1]?.retiredAt).toBe(site.clock.now().toISOString());
  });

  it('goes back to draft with a reason', async () => {
    const submitted = (await step(author, await start(), 'submission')).body as Plan;
    const returned = await step(colleague, submitted, 'return', { reason: 'The ripple limit is missing.' }).expect(200);
    expect(returned.body).toMatchObject({ openRevision: { status: 'draft' }, revisions: [{ submittedAt: null }] });
    const entry = site.db.select().from(auditEntries).all().at(-1);
    expect(entry).toMatchObject({ action: 'returned', subjectId: 'P-001 rev 1' });
    expect(entry?.after).toContain('The ripple limit is missing.');
  });

  it('has one open revision at a time, and one plan per part', async () => {
    const plan = await start();
    const answer = await author.post(`/api/plans/${plan.id}/revisions`).expect(409);
    expect(answer.body).toMatchObject({ code: 'revision-open' });
    const again = await author.post('/api/plans').send({ partId: plan.part.id, content: revisionBody() }).expect(422);
    expect(again.body).toMatchObject({ errors: [{ path: ['partId'] }] });
    const none = await author.post('/api/plans').send({ partId: 999, content: revisionBody() }).expect(422);
    expect(none.body).toMatchObject({ errors: [{ path: ['partId'], message: 'This part does not exist.' }] });
  });
});

describe('the two-person rule', () => {
  it('keeps the author from approving', async () => {
    const submitted = (await step(author, await start(), 'submission')).body as Plan;
    const answer = await step(author, submitted, 'approval').expect(409);
    expect(answer.body).toMatchObject({ code: 'own-plan' });
  });

  it('keeps whoever changed the draft from approving', async () => {
    const changed = (await change(colleague, await start(), revisionBody({ changeNote: 'Mine too.' })).expect(200))
      .body;
    const submitted = (await step(author, changed as Plan, 'submission')).body as Plan;
    const answer = await step(colleague, submitted, 'approval').expect(409);
    expect(answer.body).toMatchObject({ code: 'own-plan' });
  });

  it('is waived by the site on record', async () => {
    site.db.update(siteTable).set({ approveOwnPlans: true }).run();
    const submitted = (await step(author, await start(), 'submission')).body as Plan;
    await step(author, submitted, 'approval').expect(200);
    const entry = site.db.select().from(auditEntries).all().at(-1);
    expect(entry).toMatchObject({ action: 'approved', after: '{"twoPersonRuleWaived":true}' });
  });
});

describe('a revision', () => {
  it('is changed only while it is a draft', async () => {
    const plan = await approved();
    const answer = await change(author, plan, revisionBody()).expect(409);
    expect(answer.body).toMatchObject({ code: 'revision-state', title: 'The revision is effective, not a draft.' });
    await step(author, plan, 'submission').expect(409);
    await step(colleague, plan, 'approval').expect(409);
  });

  it('is not changed by whoever saw an older version', async () => {
    const plan = await start();
    await change(author, plan, revisionBody({ level: 'I' })).expect(200);
    await change(colleague, plan, revisionBody({ level: 'III' })).expect(412);
    await step(colleague, plan, 'submission').expect(412);
    const read = (await author.get(`/api/plans/${plan.id}`)).body as Plan;
    expect(read.revisions[0]?.level).toBe('I');
  });

  it('is approved once when two approve at the same time', async () => {
    const third = { name: 'Quentin Third', email: 'third@hollowmere.example', roles: ['quality'] } as const;
    const another = site.as(await addTestPerson(site.db, third));
    const submitted = (await step(author, await start(), 'submission')).body as Plan;
    const answers = await Promise.all([step(colleague, submitted, 'approval'), step(another, submitted, 'approval')]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 412]);
  });

  it('replaces its characteristics in the order given', async () => {
    const body = revisionBody({ characteristics: [measured('second'), measured('first')] });
    const changed = (await change(author, await start(), body).expect(200)).body as Plan;
    expect(changed.revisions[0]?.characteristics.map(({ key }) => key)).toEqual(['second', 'first']);
  });

  it('that could not be used is refused with the path of each fault', async () => {
    const characteristics = [
      measured('v', { lowerLimit: 5, upperLimit: 4 }),
      computed('r', { key: 'load-regulation', inputs: { no_load: 'v', loaded: 'nothing' } }),
    ];
    const { id } = buildPart(site.db);
    const content = revisionBody({ characteristics, classAqls: [{ class: 'minor', aql: '1.0' }] });
    const answer = await author.post('/api/plans').send({ partId: id, content }).expect(422);
    expect(answer.body).toMatchObject({
      code: 'plan-not-sound',
      errors: [
        { path: ['content', 'classAqls'] },
        { path: ['content', 'characteristics', 0, 'upperLimit'] },
        { path: ['content', 'characteristics', 1, 'formula', 'inputs', 'loaded'] },
      ],
    });
  });
});

describe('who sees which plans', () => {
  it('the dock and the bench see what is or was in force', async () => {
    const { id: authorId } = site.people.quality;
    const draft = buildPlan(site.db, { partId: buildPart(site.db).id, authorId, status: 'draft' });
    const inspector = site.as('inspector');
    expect((await inspector.get('/api/plans')).body).toEqual({ items: [] });
    await inspector.get(`/api/plans/${draft.planId}`).expect(404);
    expect((await author.get('/api/plans')).body).toMatchObject({ items: [{ number: 'P-001' }] });

    const part = buildPart(site.db, { number: 'HC-2403' });
    const { planId } = buildPlan(site.db, { partId: part.id, authorId, number: 'P-002' });
    await author.post(`/api/plans/${planId}/revisions`).expect(201);
    const seen = (await inspector.get(`/api/plans/${planId}`).expect(200)).body as Plan;
    expect(seen.openRevision).toBeNull();
    expect(seen.revisions.map(({ revision }) => revision)).toEqual([1]);
    const all = (await site.as('auditor').get(`/api/plans/${planId}`)).body as Plan;
    expect(all.revisions.map(({ revision }) => revision)).toEqual([2, 1]);
    expect((await inspector.get('/api/record-counts')).body).toMatchObject({ plans: 1 });
    expect((await author.get('/api/record-counts')).body).toMatchObject({ plans: 2 });
  });
});
