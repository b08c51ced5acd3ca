import fc from 'fast-check';
import { expect, test } from 'vitest';
import { readStudy, studyTemplate } from '../../src/inputs/index.ts';
import { TrackworthError } from '../../src/shared/index.ts';

const TEXT = studyTemplate({ title: 'T', weatherFile: 'a.epw' }).replace(
  /^#(?=(?: {2,}(?:- )?)?[a-z_]+:(?: |$))|#.*/gm,
  '',
);

/** Whatever a file holds, the answer is a study or problems with a place in the file. */
const expectAnswer = async (text: string): Promise<'read' | 'refused'> => {
  const lines = text.split('\n');
  try {
    await readStudy({ file: 'f.yaml', text });
    return 'read';
  } catch (error) {
    if (!(error instanceof TrackworthError)) throw error;
    expect(error.problems.length).toBeGreaterThan(0);
    for (const { line, column } of error.problems) {
      expect(line).toBeGreaterThanOrEqual(1);
      expect(line).toBeLessThanOrEqual(lines.length);
      expect(column).toBeGreaterThanOrEqual(1);
      expect(column).toBeLessThanOrEqual(lines[line! - 1].length + 1);
    }
    const places = error.problems.map((p) => p.line! * 1e6 + p.column!);
    expect(places).toEqual(places.toSorted((a, b) => a - b));
    return 'refused';
  }
};

/** Generous, for a busy machine; nothing here measures time. */
const LONG_MS = 60_000;

test('a study with any few characters changed is read or refused with places, never a crash', {
  timeout: LONG_MS,
}, async () => {
  const answers = { read: 0, refused: 0 };
  const piece = fc.constantFrom(
    ...'{}[]:,-#&*!|>\'"%@` \t\n09azé.~?',
    '- ',
    ': ',
    '---\n',
    '<<: ',
    '.nan',
    '__proto__: ',
  );
  const edit = fc.tuple(fc.nat(TEXT.length), fc.nat(6), piece);
  await fc.assert(
    fc.asyncProperty(fc.array(edit, { minLength: 1, maxLength: 4 }), async (edits) => {
      let text = TEXT;
      for (const [at, drop, insert] of edits) text = text.slice(0, at) + insert + text.slice(at + drop);
      answers[await expectAnswer(text)]++;
    }),
    { numRuns: 100 },
  );
  expect(answers.refused).toBeGreaterThan(20);
});

test('any value under any key is read or refused with places, never a crash', {
  timeout: LONG_MS,
}, async () => {
  const keys = [
    'title', 'weather', 'site', 'sky', 'array', 'mounts', 'losses', 'finance', 'wind', 'advice', 'compare_with',
    'file', 'table', 'time', 'ghi', 'id', 'kind', 'tilt', 'rows', 'gcr', 'drive', 'working', 'cost', 'renewals', 'year', 'dc', 'heat',
    'bearing', 'magnetic', 'true', 'back', 'taken', 'downslope', 'dated', 'declination', 'slope', 'reading', 'rise', 'run',
    'skyline', 'points', 'obstacles', 'bearings', 'error', 'axis', 'ground', 'falls_toward', 'slope_limits', 'across',
    'turns', 'from', 'to', 'elevation', 'lowest', 'highest', 'cloudy',
  ]; // biome-ignore format: one list
  const { value } = fc.letrec((tie) => ({
    value: fc.oneof(
      { maxDepth: 4 },
      fc.constantFrom(
        null,
        true,
        0,
        -1,
        2,
        1e300,
        '',
        '3:12',
        '6 %',
        '5 ft',
        'best',
        'single-axis',
        'turntable',
        'a',
        '-0.3 %/K',
        '16 E',
        'along_ridge',
        '2026-05-01',
        150,
        'magnetic',
      ),
      fc.array(tie('value'), { maxLength: 3 }),
      fc.dictionary(fc.constantFrom(...keys), tie('value'), { maxKeys: 6 }),
    ),
  }));
  await fc.assert(
    fc.asyncProperty(value, async (any) => {
      await expectAnswer(JSON.stringify(any));
      const study = {
        weather: { file: 'a' },
        mounts: [{ id: 'a', kind: 'single-axis', ...(any as object) }],
        site: any,
      };
      const roof = { id: 'a', kind: 'roof-plane', bearing: any, slope: any };
      await expectAnswer(
        JSON.stringify({ weather: { file: 'a' }, mounts: [roof], site: { skyline: any } }, null, 1),
      );

      await expectAnswer(JSON.stringify(study, null, 1));
    }),
    { numRuns: 100 },
  );
});
