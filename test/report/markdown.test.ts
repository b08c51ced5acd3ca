import fc from 'fast-check';
import { expect, test } from 'vitest';
import { md, mdImage, mdTable } from '../../src/report/markdown.ts';
import { oneLine } from '../../src/report/plain-text.ts';
import { HOSTILE } from './invented.ts';

/** CommonMark 0.31, 2.4: a backslash before ASCII punctuation stands for that character. */
const unescaped = (text: string) => text.replace(/\\([!-/:-@[-`{-~])/g, '$1');

/** What is left of `text` once every escaped character is gone: nothing in it may start anything. */
const bare = (text: string) => text.replace(/\\[!-/:-@[-`{-~]/g, '');

test('escaped text reads as it was written', () => {
  fc.assert(
    fc.property(fc.string({ unit: 'grapheme', maxLength: 60 }), (text) => {
      expect(unescaped(md(text))).toBe(oneLine(text));
    }),
  );
});

test('no character that Markdown or HTML acts upon is left bare', () => {
  const sign = fc.constantFrom(
    ...'|`*_[]()<>#~$&!=-+.1 \\\n\r\t"\'@:/xw',
    '</script>',
    '![i](x)',
    '\u2028',
    '\u202e',
  );
  fc.assert(
    fc.property(fc.array(sign, { maxLength: 30 }), (signs) => {
      const inert = md(signs.join(''));
      expect(inert).not.toMatch(/[\p{Cc}\u2028\u2029\u202e]/u);
      expect(bare(inert)).not.toMatch(/[|`*[\]<>#~$\\]/);
      expect(inert).not.toMatch(/^(?:[-+=:]|\d{1,9}[.)](?: |$)|\s)/);
      expect(inert).not.toMatch(/(?:https?|ftp):\/\/|www\./i);
    }),
  );
});

test('known attacks stay text', () => {
  expect(md('[x](javascript:alert(1))')).toBe('\\[x\\](javascript:alert(1))');
  expect(md('</script>')).toBe('\\</script\\>');
  expect(md('=1+1')).toBe('\\=1+1');
  expect(md('# not a heading')).toBe('\\# not a heading');
  expect(md('1. not a list')).toBe('1\\. not a list');
  expect(md('- not a list')).toBe('\\- not a list');
  expect(md('a\n\n# b')).toBe('a \\# b');
  expect(md('&lt; & b')).toBe('\\&lt; & b');
  expect(md('see https://x.invalid or www.x.invalid')).toBe('see https\\://x.invalid or www\\.x.invalid');
  expect(md('\u001b[31mred')).toBe('\\[31mred');
});

test('ordinary text keeps its looks', () => {
  const text =
    'Lead over mounts.tracker.own_use: 12.3 % (9 to 15), 0.109 USD/kWh; wind - not "gust", 34° tilt.';
  expect(md(text)).toBe(text);
});

test('a table keeps its number of cells whatever stands in them', () => {
  const table = mdTable(
    ['a', md(HOSTILE)],
    ['left', 'right'],
    [
      [md(HOSTILE), '1 600'],
      ['|x'.replace('|', '\\|'), '2'],
    ],
  );
  const cells = table.split('\n').map((line) => line.split(/(?<!\\)\|/).length - 2);
  expect(cells).toEqual([2, 2, 2, 2]);
});

test('an image address cannot leave its brackets', () => {
  expect(mdImage('a ] (b', 'charts/a b).svg')).toBe('![a \\] (b](charts/a%20b%29.svg)');
});
