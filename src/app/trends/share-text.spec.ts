import { shareText } from './share-text';

describe('A share', () => {
  it('reads in percent with one decimal', () => {
    expect(shareText(41, 42)).toBe('97.6\u00a0%');
  });

  it('never reads all or none where it is not', () => {
    expect(shareText(9999, 10000)).toBe('99.9\u00a0%');
    expect(shareText(1, 100000)).toBe('0.1\u00a0%');
    expect(shareText(10, 10)).toBe('100.0\u00a0%');
    expect(shareText(0, 10)).toBe('0.0\u00a0%');
  });

  it('is empty when there is nothing to share', () => {
    expect(shareText(0, 0)).toBe('');
  });
});
