import { openPage } from '../../../testing/open-page';
import { AuditPage } from './audit-page';

function entry(id: number) {
  return {
    id,
    at: '2026-03-12T14:20:00.000Z',
    person: 'K. Minde',
    action: 'changed',
    subject: 'site',
    subjectId: '1',
    subjectName: '1',
    before: { waitingTargetHours: 8 },
    after: { waitingTargetHours: 6 },
    hash: 'e3b625fe92'.repeat(6),
  };
}

describe('AuditPage', () => {
  it('shows what an entry changed and adds the next page at the end', async () => {
    const page = await openPage(AuditPage, ['auditor']);
    await page.answer('/api/audit', { items: [entry(9)], next: '9' });
    expect(page.text()).toContain('waiting target hours 8 6');
    await page.press('Load more');
    await page.answer('/api/audit?after=9', { items: [entry(8)], next: null });
    expect(page.element.querySelectorAll('tbody tr')).toHaveLength(2);
    expect(page.text()).toContain('That is the whole trail.');
  });

  it('asks only for what the address names', async () => {
    const page = await openPage(AuditPage, ['auditor'], { subject: 'lot', subjectId: '7' });
    await page.answer('/api/audit?subject=lot&subjectId=7', { items: [], next: null });
    expect(page.text()).toContain('No entry is about that.');
  });

  it('checks the chain and says where it breaks', async () => {
    const page = await openPage(AuditPage, ['quality']);
    await page.answer('/api/audit', { items: [], next: null });
    await page.press('Check the chain');
    await page.answer('/api/audit/verification', { entries: 12, intact: false, firstBroken: 5, head: 'ab' });
    expect(page.text()).toContain('The chain is broken at entry 5');
  });

  it('offers the check only to those who may', async () => {
    const page = await openPage(AuditPage, ['inspector']);
    await page.answer('/api/audit', { items: [], next: null });
    expect(page.text()).not.toContain('Check the chain');
  });
});
