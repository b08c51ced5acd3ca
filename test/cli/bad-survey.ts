import { readFileSync } from 'node:fs';
import type { BadCase } from './bad-cases.ts';
import { SAMPLE_WEATHER } from './support.ts';

const AT = ['--at', '45.6,-121.2', '--dated', '2026-05-01'];
const bearing = (title: string, args: readonly string[], says: BadCase['says']): BadCase => ({
  title,
  files: {},
  args: ['bearing', ...args],
  code: 2,
  says,
});

const year = { 'year.epw': readFileSync(SAMPLE_WEATHER, 'utf8') };
const SOUND = ['--weather', 'year.epw', '--tilt', '3:12', '--bearing', '150'];
const plane = (
  title: string,
  args: readonly string[],
  says: BadCase['says'],
  files: BadCase['files'] = {},
): BadCase => ({ title, files: { ...year, ...files }, args: ['plane', ...args], code: 2, says });

export const BAD_SURVEY_USAGE: readonly BadCase[] = [
  bearing('bearing 400', ['400', ...AT], ['bearing:', 'from 0 to 360', '400', 'Read the dial again']),
  bearing('a negative bearing', ['-10', ...AT], ['from 0 to 360', '-10']),
  bearing('a bearing that is text', ['south', ...AT], ['from 0 to 360', 'south']),
  bearing('a bare declination', ['150', '--declination', '16'], ['--declination:', 'Write 16 E or 16 W']),
  bearing('a declination in watts', ['150', '--declination', '13 Watt'], ['--declination:', '13 Watt']),
  bearing('latitude 95', ['150', '--at', '95,10', '--dated', '2026-05-01'], ['--at:', '95,10']),
  bearing(
    'longitude before latitude',
    ['150', '--at', '-121.2,45.6', '--dated', '2026-05-01'],
    ['--at:', 'Latitude comes first'],
  ),
  bearing(
    'a reading without its date',
    ['150', '--at', '45.6,-121.2'],
    ['--dated:', 'drifts with the years', 'clock is never asked', '--declination "16 E"'],
  ),
  bearing('a reading without its place', ['150', '--dated', '2026-05-01'], ['--at:', 'place to place']),
  bearing(
    'a date that is none',
    ['150', '--at', '45.6,-121.2', '--dated', '2026-02-30'],
    ['--dated:', '2026-02-30', 'year-month-day'],
  ),
  bearing(
    'a date outside the model',
    ['150', '--at', '45.6,-121.2', '--dated', '2031-01-01'],
    ['--dated:', '2015-01-01 to 2029-12-31', '2031-01-01', '--declination "16 E"'],
  ),
  bearing(
    'a place at a magnetic pole',
    ['150', '--at', '86,140', '--dated', '2026-05-01'],
    ['--at:', 'undefined at a magnetic pole', 'enter it as true'],
  ),
  bearing('a geographic pole', ['150', '--at', '90,0', '--dated', '2026-05-01'], ['--at:', 'latitude 90']),
  bearing(
    'a ridge without its downslope side',
    ['240', '--declination', '13 W', '--taken', 'along_ridge'],
    ['--downslope:', 'south-east', 'north-west', 'Say --downslope left or right'],
  ),
  bearing(
    'a back bearing taken the same way',
    ['240', '--declination', '13 W', '--back', '241'],
    ['--back:', 'near 60', '241'],
  ),
  bearing(
    'turning what is not a reading',
    ['240', '--to', 'magnetic', '--declination', '13 W', '--taken', 'facing'],
    ['--taken:', '--to magnetic'],
  ),
  bearing(
    'an unknown way of taking',
    ['240', ...AT, '--taken', 'sideways'],
    ['facing, looking_at, along_ridge'],
  ),
  bearing('--at without its value', ['240', '--at'], ['--at', 'missing']),
  bearing('no bearing at all', [], ['deg']),

  plane('a plane of nothing', [], ['--weather:', '--tilt:', '--bearing:', '--study site.yaml --mount roof']),
  plane('a mount without its study', ['--mount', 'roof'], ['--study:']),
  plane(
    'every wrong option at once',
    [
      ...['--weather', 'year.epw', '--tilt', '3/0', '--tilt-error', 'x', '--bearing', '400'],
      ...['--bearing-error', '95', '--declination', '16', '--back', '-1'],
    ],
    [
      'the command has 6 problems:',
      '--tilt: expected a run above 0',
      '--tilt-error:',
      '--bearing: expected a bearing from 0 to 360',
      '--bearing-error:',
      '--declination:',
      '--back:',
    ],
  ),
  plane('a compass bearing without its date', SOUND, ['--dated:', '--declination "16 E"', '--true']),
  plane(
    'a date outside the model',
    [...SOUND, '--dated', '2009-01-01'],
    ['--dated:', '2015-01-01 to 2029-12-31', '--declination "16 E"'],
  ),
  plane(
    'declination applied twice',
    [...SOUND, '--true', '--declination', '16 E'],
    ['--declination:', 'Leave out --declination, or --true'],
  ),
  plane(
    'a ridge without its downslope side',
    [...SOUND, '--true', '--taken', 'along_ridge'],
    ['--downslope:', 'left'],
  ),
  plane(
    'a place at a magnetic pole',
    [...SOUND, '--dated', '2026-05-01', '--latitude', '86', '--longitude', '140'],
    ['--bearing:', 'undefined at a magnetic pole'],
  ),
  plane(
    'an upright plus five',
    ['--weather', 'year.epw', '--tilt', '95', '--bearing', '1', '--true'],
    ['--tilt:', '95'],
  ),
  plane(
    'options beside a study',
    ['--study', 'study.yaml', '--mount', 'roof', '--tilt-error', '2'],
    ['--study:', '--tilt-error'],
  ),
  plane('a study without the mount named', ['--study', 'study.yaml'], ['--mount:', 'roof'], {
    'study.yaml':
      'weather: { file: year.epw }\nmounts: [ { id: roof, kind: fixed-tilt }, { id: mast, kind: dual-axis } ]\n',
  }),
  plane(
    'a mount that is not there',
    ['--study', 'study.yaml', '--mount', 'rof'],
    ['--mount:', 'rof', 'roof'],
    {
      'study.yaml': 'weather: { file: year.epw }\nmounts: [ { id: roof, kind: fixed-tilt } ]\n',
    },
  ),
  plane('a tracker', ['--study', 'study.yaml', '--mount', 'mast'], ['--mount:', 'tracker', 'mast'], {
    'study.yaml':
      'weather: { file: year.epw }\nmounts: [ { id: roof, kind: fixed-tilt }, { id: mast, kind: dual-axis } ]\n',
  }),
];

const READ = '{ magnetic: 150, dated: 2026-05-01 }';
const studyWith = (site: string, bearing = READ): string =>
  `weather: { file: year.epw }\nsite: ${site}\nmounts:\n  - { id: roof, kind: roof-plane, tilt: 3:12, bearing: ${bearing} }\n`;
const study = (
  title: string,
  text: string,
  says: BadCase['says'],
  files: BadCase['files'] = {},
): BadCase => ({
  title,
  files: { ...year, 'study.yaml': text, ...files },
  code: 3,
  says,
});
const FILE = '{ skyline: { file: roof.csv } }';

export const BAD_SURVEYS: readonly BadCase[] = [
  study('a bearing of 400', studyWith('{}', '{ magnetic: 400, dated: 2026-05-01 }'), [
    'study.yaml:4:68 mounts.roof.bearing.magnetic:',
    'from 0 to 360',
  ]),
  study('a slope of 3/0', studyWith('{}').replace('tilt: 3:12', 'slope: { reading: 3/0 }'), [
    'study.yaml:4:53 mounts.roof.slope.reading:',
    'a run above 0',
  ]),
  study('a date outside the model', studyWith('{}', '{ magnetic: 150, dated: 2031-05-01 }'), [
    'study.yaml:4:',
    'mounts.roof.bearing.dated:',
    '2015-01-01 to 2029-12-31',
  ]),
  study('a place at a magnetic pole', studyWith('{ latitude: 86, longitude: 140 }'), [
    'study.yaml:4:',
    'mounts.roof.bearing:',
    'undefined at a magnetic pole',
  ]),
  study('a skyline with one point', studyWith('{ skyline: { points: [ [90, 5] ] } }'), [
    'study.yaml:2:',
    'site.skyline',
    'at least two bearings',
  ]),
  study('a skyline of elevation 95', studyWith('{ skyline: { points: [ [90, 5], [180, 95] ] } }'), [
    'study.yaml:2:',
    'from 0 to 90',
    '95',
  ]),
  study(
    'a missing skyline file',
    studyWith(FILE),
    ['study.yaml:2:26 site.skyline.file:', 'a skyline file', 'roof.csv', 'other.csv'],
    { 'other.csv': 'bearing,elevation\n' },
  ),
  study(
    'a folder in place of a skyline file',
    studyWith(FILE),
    ['study.yaml:2:26 site.skyline.file:', 'a folder'],
    {
      'roof.csv/x.csv': '',
    },
  ),
  study(
    'the second of two skyline files missing',
    studyWith('{ skyline: [ { name: a, file: a.csv }, { name: b, file: b.csv } ] }'),
    ['study.yaml:2:', 'site.skyline.#2.file:', 'b.csv'],
    { 'a.csv': 'bearing,elevation\n0,5\n180,9\n' },
  ),
  study(
    'a skyline file that is wrong in two lines',
    studyWith(FILE),
    ['roof.csv:2', '95', 'roof.csv:3', '"high"'],
    {
      'roof.csv': 'bearing,elevation\n90,95\n120,high\n',
    },
  ),
  {
    title: 'a wrong skyline file on the command line, which is a file and no option',
    files: { ...year, 'roof.csv': 'bearing,elevation\n90,5\n' },
    args: ['plane', ...SOUND, '--true', '--skyline', 'roof.csv'],
    code: 3,
    says: ['roof.csv:2', 'at least two bearings'],
  },
  {
    title: 'a missing weather file of a plane',
    files: year,
    args: ['plane', '--weather', 'yaer.epw', '--tilt', '3:12', '--bearing', '150', '--true'],
    code: 3,
    says: ['yaer.epw', 'no file', 'year.epw'],
  },
];
