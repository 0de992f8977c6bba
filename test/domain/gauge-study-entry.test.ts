import { delimitedText, DelimitedTextFault } from '#shared/gauge-study/delimited-rows';
import { studyBlock } from '#shared/gauge-study/study-block';
import { cellAt, columnOf } from '#shared/gauge-study/study-cell';
import { reshapedValues } from '#shared/gauge-study/reshaped-values';
import { studyFile } from '#shared/gauge-study/study-file';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

const PLAN = { parts: ['Unit 1', 'Unit 2', 'Unit 3'], persons: ['Ann', 'Bo'], trials: 2 };
const NUMBERS = { unit: 'V', show: String };
const cell = (part: number, person: number, trial: number) => ({ part, person, trial });

describe('a block from a spreadsheet', () => {
  it('goes row by row from the cell it is set into, over the persons', () => {
    expect(studyBlock('1\t2\t3\n4\t5\t6\r\n', cell(1, 0, 1), PLAN)).toEqual({
      state: 'placed',
      texts: [
        { cell: cell(1, 0, 1), text: '1' },
        { cell: cell(1, 1, 0), text: '2' },
        { cell: cell(1, 1, 1), text: '3' },
        { cell: cell(2, 0, 1), text: '4' },
        { cell: cell(2, 1, 0), text: '5' },
        { cell: cell(2, 1, 1), text: '6' },
      ],
    });
  });

  it('keeps what nobody can read, for its cell to say so, and leaves cells alone for which it is empty', () => {
    const block = studyBlock('12.1\t\tn/a', cell(0, 0, 0), PLAN);
    expect(block).toEqual({
      state: 'placed',
      texts: [
        { cell: cell(0, 0, 0), text: '12.1' },
        { cell: cell(0, 1, 0), text: 'n/a' },
      ],
    });
  });

  it('is not placed at all where it reaches beyond the table', () => {
    expect(studyBlock('1\n2\n3', cell(1, 1, 1), PLAN)).toEqual({
      state: 'refused',
      message:
        'The block has 3 rows and 1 column; from Unit 2, Bo, trial 2 on there is room for 2 rows and 1 column. Nothing was placed.',
    });
    expect(studyBlock('1\t2', cell(0, 1, 1), PLAN).state).toBe('refused');
  });

  it('finds every cell again by its column', () => {
    for (let column = 0; column < 4; column += 1) expect(columnOf(PLAN, cellAt(PLAN, 1, column))).toBe(column);
  });
});

describe('a file of readings', () => {
  it('has part, person, trial and value in any order, and names as people write them', () => {
    const { texts, faults } = studyFile(
      'value,trial,person,part\n12.1,2,ann,unit 3\n"0.0121",1,Bo,Unit 1\n',
      PLAN,
      NUMBERS,
    );
    expect(faults).toEqual([]);
    expect(texts).toEqual([
      { cell: cell(2, 0, 1), text: '12.1' },
      { cell: cell(0, 1, 0), text: '0.0121' },
    ]);
  });

  it('has decimal commas behind semicolons, and units where they are written', () => {
    const { texts } = studyFile('part;person;trial;value\nUnit 1;Ann;1;12,1\nUnit 1;Ann;2;35m', PLAN, NUMBERS);
    expect(texts.map(({ text }) => text)).toEqual(['12.1', '0.035']);
  });

  it('has every fault named with its line, and the rest placed', () => {
    const file = [
      'part,person,trial,value',
      'Unit 9,Ann,1,1',
      '',
      'Unit 1,Cy,1,1',
      'Unit 1,Ann,3,1',
      'Unit 1,Ann,1,twelve',
      'Unit 1,Ann,1,12',
      'Unit 2,Bo,2,12',
    ].join('\r\n');
    const { texts, faults } = studyFile(file, PLAN, NUMBERS);
    expect(faults.map(({ line }) => line)).toEqual([2, 4, 5, 6, 7]);
    expect(faults.map(({ message }) => message)).toEqual([
      '“Unit 9” is no part of this study.',
      '“Cy” is no person of this study.',
      '“3” is no trial of this study: they are numbered 1 to 2.',
      expect.stringMatching(/^Unit 1, Ann, trial 1: /),
      'Unit 1, Ann, trial 1 is given in line 6 already.',
    ]);
    expect(texts).toEqual([
      { cell: cell(0, 0, 0), text: 'twelve' },
      { cell: cell(1, 1, 1), text: '12' },
    ]);
  });

  it('says which column is missing', () => {
    expect(studyFile('part,person,value\n', PLAN, NUMBERS).faults).toEqual([
      { line: 1, message: 'The first line must name the columns part, person, trial, value; missing: trial.' },
    ]);
  });

  it('is never more than a list of readings and of faults, whatever is in it', () => {
    const piece = fc.constantFrom(
      'part,person,trial,value',
      'Unit 1',
      ',',
      ';',
      '\t',
      '"',
      '\n',
      '\r',
      '1',
      'Ann',
      '1e999',
    );
    fc.assert(
      fc.property(fc.array(fc.oneof(piece, fc.string({ unit: 'binary' })), { maxLength: 30 }), (pieces) => {
        const { texts, faults } = studyFile(pieces.join(''), PLAN, NUMBERS);
        expect(texts.every((placed) => placed.text !== '')).toBe(true);
        expect(faults.every(({ line, message }) => line >= 1 && message !== '')).toBe(true);
      }),
    );
  });
});

describe('a delimited text', () => {
  it('keeps delimiters, line ends and quotes inside quotes, and the line each row begins on', () => {
    expect(delimitedText('\ufeffa,"b ""c"", d"\n\n"two\nlines",e,').rows).toEqual([
      { line: 1, cells: ['a', 'b "c", d'] },
      { line: 3, cells: ['two\nlines', 'e', ''] },
    ]);
  });

  it('is refused at the line of a quote that is not closed', () => {
    expect(() => delimitedText('a,b\n"c,d\n')).toThrow(DelimitedTextFault);
    expect(() => delimitedText('a,b"c"\n')).toThrow(DelimitedTextFault);
  });

  it('reads back what was written by its rules', () => {
    const content = fc.string({ unit: fc.constantFrom('a', '"', ',', '\n', ' ', '1') });
    fc.assert(
      fc.property(
        fc.array(fc.array(content, { minLength: 2, maxLength: 3 }), { minLength: 1, maxLength: 5 }),
        (rows) => {
          const text = rows.map((cells) => cells.map((one) => `"${one.replaceAll('"', '""')}"`).join(',')).join('\n');
          const kept = rows.filter((cells) => cells.some((one) => one !== ''));
          // The delimiter is found in the first line, where this text has commas unless a cell breaks the line.
          if (/^[^\n]*,[^\n]*/.test(text)) expect(delimitedText(text).rows.map(({ cells }) => cells)).toEqual(kept);
        },
      ),
    );
  });
});

describe('the readings of a study whose size is changed', () => {
  const values = [
    [[1, 2], [3, 4]],
    [[5, 6], [7, 8]],
    [[9, null], [11, 12]],
  ]; // prettier-ignore

  it('stay with the names they were taken of', () => {
    const turned = { parts: ['Unit 3', 'Unit 1'], persons: ['Bo', 'Ann', 'Cy'], trials: 3 };
    expect(reshapedValues({ ...PLAN, values }, turned)).toEqual([
      [[11, 12, null], [9, null, null], [null, null, null]],
      [[3, 4, null], [1, 2, null], [null, null, null]],
    ]); // prettier-ignore
  });

  it('follow a name that is only written anew', () => {
    const renamed = { ...PLAN, persons: ['Ann', 'Boris'] };
    expect(reshapedValues({ ...PLAN, values }, renamed)).toEqual(values);
  });

  it('do not follow into the place of another name', () => {
    const replaced = { ...PLAN, parts: ['Unit 2', 'Unit 9', 'Unit 3'] };
    expect(reshapedValues({ ...PLAN, values }, replaced).map((rows) => rows[0]?.[0])).toEqual([5, null, 9]);
  });
});
