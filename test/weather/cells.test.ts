import fc from 'fast-check';
import { expect, test } from 'vitest';
import { type Cells, cutCells, cutPlain, cutQuoted } from '../../src/weather/cells.ts';
import { Problems } from '../../src/weather/problems.ts';
import { inventedYear, writeEpw, writeTmy3 } from '../support/weather-writers.ts';

const columnOf = (c: Cells, slot: number): string[] => Array.from(c.line, (_, row) => c.cell(slot, row));
const plainOf = (c: Cells, slots: number) => ({
  count: c.count,
  line: [...c.line],
  faulty: [...c.faulty],
  cells: Array.from({ length: slots }, (_, slot) => columnOf(c, slot)),
});

test('the direct cut and csv-parse give identical cells for whole EPW and TMY3 bodies', async () => {
  const year = inventedYear();
  for (const [lines, from, delimiter] of [
    [writeEpw(year), 8, ','],
    [writeTmy3(year), 2, ','],
    [writeTmy3(year, { delimiter: '\t', padded: false }), 2, '\t'],
  ] as const) {
    const request = {
      lines,
      from,
      delimiter,
      wanted: [0, 1, 3, 6, 12],
      width: lines[from].split(delimiter).length,
    };
    const problems = new Problems('t');
    const direct = cutPlain(request, problems);
    expect(plainOf(await cutQuoted(request, problems), 5)).toEqual(plainOf(direct, 5));
    expect(direct.count).toBe(8760);
    expect(problems.any).toBe(false);
  }
});

test('property: both ways agree on any small body without quotation marks, faulty rows and blank lines included', async () => {
  const cell = fc.stringMatching(/^[-a-z0-9. ]{0,5}$/);
  const line = fc.oneof(
    { weight: 6, arbitrary: fc.array(cell, { minLength: 3, maxLength: 5 }) },
    { weight: 1, arbitrary: fc.constant(['']) },
  );
  await fc.assert(
    fc.asyncProperty(fc.array(line, { maxLength: 12 }), async (rows) => {
      const lines = ['head', ...rows.map((cells) => cells.join(';'))];
      const request = { lines, from: 1, delimiter: ';', wanted: [3, 0], width: 4 };
      const [a, b] = [new Problems('t'), new Problems('t')];
      expect(plainOf(await cutQuoted(request, a), 2)).toEqual(plainOf(cutPlain(request, b), 2));
      expect(a.any).toBe(b.any);
    }),
  );
});

test('one quotation mark anywhere in the body is enough to call csv-parse', async () => {
  const request = { lines: ['1,2', '"3,5",4'], from: 0, delimiter: ',', wanted: [0, 1], width: 2 };
  const cells = await cutCells(request, new Problems('t'));
  expect([columnOf(cells, 0), columnOf(cells, 1)]).toEqual([
    ['1', '3,5'],
    ['2', '4'],
  ]);
});
