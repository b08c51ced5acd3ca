import fc from 'fast-check';
import stringWidth from 'string-width';
import { expect, test } from 'vitest';
import { columnsOf, hanging, padLeft, padRight, shorten, wrap } from '../../src/report/columns.ts';

test('wide characters take two columns and combining ones none', () => {
  // Unicode Standard Annex 11: East Asian Wide characters; a combining acute accent adds no width.
  expect([columnsOf('abc'), columnsOf('横浜'), columnsOf('e\u0301'), columnsOf('°·²—…')]).toEqual([
    3, 4, 1, 5,
  ]);
});

test('long text ends in an ellipsis and fits', () => {
  expect(shorten('Ground rack', 11)).toBe('Ground rack');
  expect(shorten('Ground rack', 8)).toBe('Ground…');
  expect(shorten('横浜の屋根', 6)).toBe('横浜…');
});

test('padding counts columns, not characters', () => {
  expect(padLeft('横', 4)).toBe('  横');
  expect(padRight('横', 4)).toBe('横  ');
});

test('wrapped text loses nothing and no line is too wide', () => {
  fc.assert(
    fc.property(
      fc.array(fc.string({ unit: fc.constantFrom('a', 'b', '横', '-'), minLength: 1, maxLength: 40 }), {
        maxLength: 12,
      }),
      fc.integer({ min: 2, max: 30 }),
      (words, width) => {
        const lines = wrap(words.join(' '), width);
        expect(lines.join('').replaceAll(' ', '')).toBe(words.join(''));
        for (const line of lines) expect(columnsOf(line)).toBeLessThanOrEqual(width);
      },
    ),
  );
});

test('a line never ends inside a number or before its per cent sign', () => {
  expect(wrap('costs 26.8 % more than 1 600 USD', 10)).toEqual(['costs', '26.8 %', 'more than', '1 600 USD']);
});

test('a hanging paragraph names itself once', () => {
  expect(hanging('Doubt', 'one two three', 8, 16)).toEqual(['Doubt   one two', '        three']);
});

test('the quick count of Latin text agrees with the general one', () => {
  let compared = 0;
  for (let code = 0x20; code < 0x2030; code++) {
    const ch = String.fromCharCode(code);
    if (!/[\p{L}\p{N}\p{P}\p{S}]/u.test(ch) || (code > 0x24f && code < 0x2010)) continue;
    expect(columnsOf(ch), code.toString(16)).toBe(stringWidth(ch));
    compared++;
  }
  expect(compared).toBeGreaterThan(500);
});
