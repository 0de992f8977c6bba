import { uncertaintyText } from './uncertainty-text';

const plain = (text: string) => text.replace(/\s/g, ' ');

describe('an expanded uncertainty', () => {
  it('has one significant digit, two where the first is 1', () => {
    expect(plain(uncertaintyText(0.0834, 'V p-p'))).toBe('± 0.08 V');
    expect(plain(uncertaintyText(0.0134, 'V'))).toBe('± 0.013 V');
    expect(plain(uncertaintyText(0.096, 'V'))).toBe('± 0.1 V');
    expect(plain(uncertaintyText(0.00185, 'mV p-p'))).toBe('± 1.9 mV');
    expect(plain(uncertaintyText(17e6, 'MΩ'))).toBe('± 17 MΩ');
    expect(plain(uncertaintyText(0, 'V'))).toBe('± 0 V');
  });
});
