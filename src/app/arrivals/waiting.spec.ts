import { lotHead } from '../../testing/lot-samples';
import { belongsTo, countWords, queueAt } from './waiting';

const noon = new Date('2026-03-12T12:00:00.000Z');
const arrived = (id: number, at: string, targetHours = 8) =>
  lotHead({ id, arrivedAt: `2026-03-12T${at}:00.000Z`, targetHours });

describe('The queue', () => {
  it('puts lots past their target first, the latest of them at the top, then the longest waiting', () => {
    const lots = [arrived(1, '11:00'), arrived(2, '05:00', 8), arrived(3, '09:00', 1), arrived(4, '03:30', 8)];
    expect(queueAt(noon, lots).map(({ lot }) => lot.id)).toEqual([3, 4, 2, 1]);
  });

  it('waits no time before it has arrived, whatever the clocks say', () => {
    expect(queueAt(noon, [arrived(1, '12:05')])[0]?.hours).toBe(0);
  });

  it('knows counts that differ and parts without a plan', () => {
    const [short] = queueAt(noon, [lotHead({ countedQuantity: 1196, sampleSize: null })]);
    expect(short && belongsTo('differs', short)).toBe(true);
    expect(short && belongsTo('no-plan', short)).toBe(true);
    expect(countWords(short?.difference ?? 0)).toBe('Count differs by 4');
    expect(countWords(0)).toBe('Complete');
  });
});
