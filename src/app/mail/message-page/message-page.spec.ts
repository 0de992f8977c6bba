import { openPage } from '../../../testing/open-page';
import { MessagePage } from './message-page';

const NOTICE = {
  id: 3,
  messageId: '<a@hollowmere.example>',
  event: 'lot-rejected',
  to: ['engineering@hollowmere.example'],
  subject: 'Lot L-26-0412 rejected [NC-26-031]',
  status: 'queued',
  queuedAt: '2026-03-12T14:20:00.000Z',
  sentAt: null,
  attempts: 1,
  text: 'Lot L-26-0412 rejected',
  html: '<p style="color: red">Lot L-26-0412 rejected</p><script>top.stolen = true</script>',
  nextAttemptAt: '2026-03-12T14:22:00.000Z',
  tries: [{ at: '2026-03-12T14:21:00.000Z', outcome: 'failed', detail: '451 Try again later' }],
};

describe('MessagePage', () => {
  it('says what became of each attempt and when the next one is due', async () => {
    const page = await openPage(MessagePage, ['admin'], { id: 3 });
    await page.answer('/api/mail/3', NOTICE);
    expect(page.text()).toContain('451 Try again later');
    expect(page.text()).toContain('Next attempt');
  });

  it('shows the letter in a frame that may run nothing', async () => {
    const page = await openPage(MessagePage, ['admin'], { id: 3 });
    await page.answer('/api/mail/3', NOTICE);
    const frame = page.element.querySelector('iframe');
    expect(frame?.getAttribute('sandbox')).toBe('');
    expect(frame?.getAttribute('srcdoc')).toContain('color: red');
  });
});
