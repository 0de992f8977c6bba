import { pastedCells, pastedRows } from '#shared/bench/pasted-cells';
import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

const COLUMNS = [
  { key: 'marking', name: 'Marking' },
  { key: 'v_no_load', name: 'No-load voltage' },
  { key: 'v_loaded', name: 'Loaded voltage' },
];
const target = { units: 5, columns: COLUMNS, from: { unit: 2, column: 1 } };

describe('text copied from a spreadsheet', () => {
  it('has rows on lines and columns between tabs', () => {
    expect(pastedRows('17.2\t12.1\r\n17.3\t12.0\r\n')).toEqual([
      ['17.2', '12.1'],
      ['17.3', '12.0'],
    ]);
  });

  it('keeps empty cells, and drops empty rows at the end', () => {
    expect(pastedRows('1\t\t3\n\t5\t\n\n')).toEqual([
      ['1', '', '3'],
      ['', '5', ''],
    ]);
    expect(pastedRows('')).toEqual([]);
  });

  it('may hold tabs, line breaks and quotes inside quotes', () => {
    expect(pastedRows('"a\tb"\t"c ""d""\ne"\n1\t2')).toEqual([
      ['a\tb', 'c "d"\ne'],
      ['1', '2'],
    ]);
  });

  it('comes out as it went in, whatever the cells hold', () => {
    const cell = fc.string({ maxLength: 8 }).map((text) => text.trim());
    const row = fc.array(cell, { minLength: 2, maxLength: 2 });
    fc.assert(
      fc.property(fc.array(row, { minLength: 1, maxLength: 4 }), (rows) => {
        fc.pre(rows.at(-1)?.some((each) => each !== '') === true);
        const text = rows.map((each) => each.map((one) => `"${one.replaceAll('"', '""')}"`).join('\t')).join('\n');
        expect(pastedRows(text)).toEqual(rows);
      }),
    );
  });
});

describe('a pasted block', () => {
  it('lies from the cell in focus down and to the right', () => {
    const { headed, cells, faults } = pastedCells(pastedRows('17.2\t12.1\n\t12.0'), target);
    expect(headed).toBe(false);
    expect(cells).toEqual([
      { unit: 2, key: 'v_no_load', text: '17.2' },
      { unit: 2, key: 'v_loaded', text: '12.1' },
      { unit: 3, key: 'v_loaded', text: '12.0' },
    ]);
    expect(faults).toEqual([]);
  });

  it('goes by the names of characteristics in its first row, by key or title, with units in brackets', () => {
    const rows = pastedRows('Unit\tLoaded voltage [V]\tv_no_load\tColour\n4\t12.1\t17.2\tblue');
    const { headed, cells, faults } = pastedCells(rows, target);
    expect(headed).toBe(true);
    expect(cells).toEqual([
      { unit: 4, key: 'v_loaded', text: '12.1' },
      { unit: 4, key: 'v_no_load', text: '17.2' },
    ]);
    expect(faults).toEqual([{ row: null, message: 'The plan has no characteristic “Colour”.' }]);
  });

  it('without a column of unit numbers begins at the unit in focus', () => {
    const { cells } = pastedCells(pastedRows('Loaded voltage\n12.1\n12.2'), target);
    expect(cells.map(({ unit }) => unit)).toEqual([2, 3]);
  });

  it('says what lies outside of the sample and beyond the last characteristic', () => {
    const outside = pastedCells(pastedRows('1\n2\n3\n4\n5'), target);
    expect(outside.cells).toHaveLength(4);
    expect(outside.faults).toEqual([{ row: 5, message: 'Unit 6 is not in the sample of 5.' }]);
    const beyond = pastedCells(pastedRows('1\t2\t3'), target);
    expect(beyond.faults).toEqual([{ row: 1, message: '“3” lies beyond the last characteristic.' }]);
    const named = pastedCells(pastedRows('Unit\tMarking\n9\tPass\n\tPass'), target);
    expect(named.faults.map(({ row }) => row)).toEqual([2, 3]);
  });
});
