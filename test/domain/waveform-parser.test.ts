import { WaveformNotUnderstood } from '#shared/waveform/waveform-not-understood';
import { WaveformParser, type ParsedWaveform } from '#shared/waveform/waveform-parser';
import { describe, expect, it } from 'vitest';

function read(text: string | Uint8Array, { channel = null as string | null, piece = Infinity, most = 1000 } = {}) {
  const bytes = typeof text === 'string' ? new TextEncoder().encode(text) : text;
  const parser = new WaveformParser(channel, most);
  for (let at = 0; at < bytes.length; at += piece) parser.push(bytes.slice(at, at + piece));
  return parser.finish();
}

/** Four samples a millisecond apart, as numbers. */
const VOLTS = [12.5, 12.25, -0.125, 13];
const shape = ({ volts, start, interval, columns, channel }: ParsedWaveform) => ({
  volts: [...volts],
  start,
  interval,
  columns,
  channel,
});
const PLAIN = { volts: VOLTS, start: 0, interval: 0.001, columns: ['volts'], channel: 'volts' };

describe('a waveform file', () => {
  it.each([
    ['comma and point', 'time,volts\n0,12.5\n0.001,12.25\n0.002,-0.125\n0.003,13\n'],
    ['semicolon and comma', 'time;volts\r\n0;12,5\r\n0,001;12,25\r\n0,002;-0,125\r\n0,003;13,0\r\n'],
    ['tabs', 'time\tvolts\n0\t12.5\n0.001\t12.25\n0.002\t-.125\n0.003\t13.'],
    ['tabs and comma', 'time\tvolts\n0\t12,5\n0,001\t12,25\n0,002\t-,125\n0,003\t13'],
    ['runs of spaces', '  time   volts\n  0.000   12.5\n  0.001   12.25\n  0.002   -0.125\n  0.003   13\n'],
    ['spaces and comma', 'time volts\n0,000 12,5\n0,001 12,25\n0,002 -0,125\n0,003 13,0\n'],
    ['bars', 'time|volts\n0|12.5\n0.001|12.25\n0.002|-0.125\n0.003|13\n'],
    ['exponents', 'time,volts\n0E0,1.25e1\n1e-3,1225E-2\n2.0E-03,-1.25e-1\n+3e-3,+1.3E+01\n'],
    ['a delimiter at the end of rows', 'time,volts,\n0,12.5,\n0.001,12.25,\n0.002,-0.125,\n0.003,13,\n'],
    ['quotes', '"time","volts"\n"0","12.5"\n"0.001","12.25"\n"0.002","-0.125"\n"0.003","13"\n'],
    ['spaces after commas', 'time, volts\n0, 12.5\n0.001, 12.25\n0.002, -0.125\n0.003, 13\n'],
    ['a byte order mark', '\ufefftime,volts\n0,12.5\n0.001,12.25\n0.002,-0.125\n0.003,13\n'],
    ['returns alone', 'time,volts\r0,12.5\r0.001,12.25\r0.002,-0.125\r0.003,13\r'],
    ['empty rows', 'time,volts\n\n0,12.5\n\n0.001,12.25\n0.002,-0.125\n0.003,13\n\n\n'],
    ['rows of headings', 'Captured,2026-03-12\nPoints,4\n\ntime,volts\n0,12.5\n0.001,12.25\n0.002,-0.125\n0.003,13\n'],
    ['a row of units', 'time,volts\ns,V\n0,12.5\n0.001,12.25\n0.002,-0.125\n0.003,13\n'],
    ['milliseconds in a row of units', 'time,volts\n(ms),(V)\n0,12.5\n1,12.25\n2,-0.125\n3,13\n'],
    [
      'a column of words',
      'time,volts,state\n0,12.5,ok\n0.001,12.25,ok\n0.002,-0.125,ok\n0.003,13,ok\n',
      ['volts', 'state'],
    ],
  ])('is read with %s', (_name, text, columns = ['volts']) => {
    expect(shape(read(text))).toEqual({ ...PLAIN, columns });
  });

  it.each([
    ['Time (ms),CH1 (mV)', 0.001, 0.001],
    ['time_us,out_V', 1e-6, 1],
    ['t/ns,U [µV]', 1e-9, 1e-6],
    ['Time [s],Kanal 1', 1, 1],
  ])('has the units of its headings: %s', (heading, seconds, volts) => {
    const { interval, volts: read1 } = read(`${heading}\n0,1\n1,2\n2,4\n`);
    expect(interval).toBeCloseTo(seconds, 15);
    expect([...read1]).toEqual([1, 2, 4].map((value) => Math.fround(value * volts)));
  });

  it('without headings names its columns by their place', () => {
    expect(read('0,1,5\n1,2,6\n').columns).toEqual(['Column 2', 'Column 3']);
  });

  it('gives the column that is asked for', () => {
    const text = 'time,CH1,CH2\n0,1,5\n1,2,6\n';
    expect([...read(text).volts]).toEqual([1, 2]);
    expect([...read(text, { channel: 'CH2' }).volts]).toEqual([5, 6]);
    expect(() => read(text, { channel: 'CH3' })).toThrow('The file has no column “CH3”. It has “CH1”, “CH2”.');
  });

  it('has its time where the heading says', () => {
    const { volts, interval } = read('point,Time,CH1\n1,0.0,3\n2,0.5,4\n3,1.0,5\n', { channel: 'CH1' });
    expect([...volts]).toEqual([3, 4, 5]);
    expect(interval).toBe(0.5);
  });

  it('is read the same in pieces of any size', () => {
    const rows = Array.from({ length: 9000 }, (_, at) =>
      `${(at * 1e-4).toFixed(4)};${(at % 97) / 8}`.replaceAll('.', ','),
    );
    const text = ['Zeit;Spannung', ...rows].join('\r\n');
    const whole = read(text, { most: 10_000 });
    expect(whole.volts).toHaveLength(9000);
    for (const piece of [1013, 65_536, 100_000]) expect(read(text, { piece, most: 10_000 })).toEqual(whole);
    expect(whole.volts[96]).toBe(12);
  });

  it('takes instants printed with too few digits as evenly spaced', () => {
    const rows = Array.from({ length: 100 }, (_, at) => `${(at * 4e-6).toFixed(5)},${at}`);
    const { interval, interpolated, volts } = read(rows.join('\n'));
    expect(interpolated).toBe(false);
    expect(interval).toBeCloseTo(4e-6, 7);
    expect(volts).toHaveLength(100);
  });

  it('lays uneven samples on even instants, along straight lines', () => {
    const { volts, interpolated, interval } = read('0,0\n1,10\n3,30\n4,40\n');
    expect(interpolated).toBe(true);
    expect(interval).toBeCloseTo(4 / 3, 12);
    [0, 40 / 3, 80 / 3, 40].forEach((value, at) => expect(volts[at]).toBeCloseTo(value, 5));
  });
});

describe('a file that is no waveform', () => {
  const binary = new Uint8Array([0x50, 0x4b, 3, 4, 0, 0, 1, 2, 0xff]);
  const utf16 = new Uint8Array([0xff, 0xfe, 0x30, 0, 0x2c, 0, 0x31, 0]);
  it.each<[string, string | Uint8Array, string]>([
    ['nothing', '', 'The file is empty.'],
    ['a text', 'Dear all,\nplease find the readings attached.\n', 'no rows of numbers'],
    ['one column', 'volts\n1\n2\n3\n', 'one column of numbers'],
    ['one row', 'time,volts\n0,1\n', 'one row of numbers'],
    ['a binary file', binary, 'is not a text'],
    ['two bytes to a letter', utf16, 'UTF-16'],
    ['NaN', 'time,volts\n0,1\n1,NaN\n2,1\n', 'Row 3: “NaN” stands where the voltage should be.'],
    ['NaN in the first row', 'time,volts\n0,NaN\n1,1\n2,1\n', 'Row 2: “NaN” stands where the voltage should be.'],
    ['infinity', '0,1\n1,inf\n', 'Row 2: “inf” stands where the voltage should be.'],
    ['a number beyond all numbers', '0,1\n1,1e999\n', 'Row 2: “1e999” stands where the voltage should be.'],
    ['a voltage beyond all supplies', '0,1\n1,1e12\n', 'Row 2: the voltage is larger than any supply gives.'],
    ['a missing value', 'time,volts\n0,1\n1,\n', 'Row 3: the voltage is missing.'],
    [
      'a word in the middle',
      'time,volts\n0,1\n\n1,overload\n',
      'Row 4: “overload” stands where the voltage should be.',
    ],
    ['a short row', 'time,volts\n0,1\n1\n', 'Row 3: it has fewer columns than the rows above it.'],
    ['time that goes backwards', 'time,volts\n0,1\n2,1\n1,1\n', 'Row 4: time goes backwards'],
    ['time that stands still', '1,1\n1,2\n1,3\n', 'Time stands still'],
    [
      'a gap',
      `${Array.from({ length: 90 }, (_, at) => `${at},1`).join('\n')}\n300,1\n`,
      'Row 91: samples are missing before it: time jumps by 211000 ms.',
    ],
    ['too many samples', Array.from({ length: 1001 }, (_, at) => `${at},1`).join('\n'), 'more than 1\u202f000 samples'],
    ['a row without end', `0,1\n1,2\n${'3'.repeat(70_000)}`, 'Row 3: '],
  ])('is told so: %s', (_name, content, message) => {
    expect(() => read(content)).toThrow(WaveformNotUnderstood);
    expect(() => read(content)).toThrow(message);
  });
});
