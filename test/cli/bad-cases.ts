import { readFileSync } from 'node:fs';
import { MOUNTS, SAMPLE_WEATHER, simplestStudy } from './support.ts';

/** One thing that a user gets wrong: the files, the command, and what the message must say. */
export interface BadCase {
  readonly title: string;
  readonly files: Readonly<Record<string, string | Uint8Array>>;
  /** Default: compare study.yaml. */
  readonly args?: readonly string[];
  readonly code: 2 | 3 | 4;
  /** All of these, in any order. */
  readonly says: readonly (string | RegExp)[];
}

const sample = readFileSync(SAMPLE_WEATHER, 'utf8');
const sampleLines = sample.split(/\r?\n/);
/** The sample year with one of its lines changed; lines count from 1. */
const withLine = (line: number, change: (cells: string[]) => string[]): string =>
  sampleLines.map((text, i) => (i === line - 1 ? change(text.split(',')).join(',') : text)).join('\n');
const setCell = (line: number, cell: number, value: string): string =>
  withLine(line, (cells) => cells.with(cell, value));

/** Global horizontal irradiance in EPW: the 14th cell. */
const GHI = 13;
const weatherCase = (title: string, weather: string | Uint8Array, says: BadCase['says']): BadCase => ({
  title,
  files: { 'study.yaml': simplestStudy('year.epw'), 'year.epw': weather },
  code: 3,
  says,
});
const studyCase = (title: string, study: string | Uint8Array, says: BadCase['says']): BadCase => ({
  title,
  files: { 'study.yaml': study },
  code: 3,
  says,
});
const weatherLine = `weather: { file: ${JSON.stringify(SAMPLE_WEATHER)} }\n`;

export const BAD_STUDIES: readonly BadCase[] = [
  {
    title: 'a device that never ends',
    files: {},
    args: ['compare', '/dev/zero'],
    code: 3,
    says: ['/dev/zero', 'a device'],
  },
  {
    title: 'a weather file in place of the study',
    files: { 'year.epw': sample },
    args: ['compare', 'year.epw'],
    code: 3,
    says: ['year.epw', 'weather file', 'trackworth start'],
  },
  {
    title: 'a missing study',
    files: { 'other.yaml': 'x: 1' },
    code: 3,
    says: ['study.yaml', 'no file', 'other.yaml'],
  },
  {
    title: 'a folder in place of the study',
    files: { 'study.yaml/site.yaml': 'x: 1' },
    code: 3,
    says: ['a folder', 'site.yaml'],
  },
  studyCase('an empty study', '', ['study.yaml:1:1', 'found nothing']),
  studyCase('a binary study', new Uint8Array(readFileSync(process.execPath).subarray(0, 4096)), [
    'study.yaml:1',
    'text',
  ]),
  studyCase('a study that is a list', '- title: x\n- mounts: y\n', ['study.yaml:1:1', 'list']),
  studyCase('latitude 95', `title: x\nsite: { latitude: 95 }\n${weatherLine}${MOUNTS}`, [
    'study.yaml:2:19 site.latitude:',
    'from -90 to 90',
    '95',
  ]),
  studyCase(
    'tilt 120',
    `${weatherLine}mounts:\n  - { id: roof, kind: roof-plane, tilt: 120, azimuth: 180 }\n`,
    ['study.yaml:3:41 mounts.roof.tilt:', '120'],
  ),
  studyCase(
    'a negative cost',
    `${weatherLine}mounts:\n  - { id: ground, kind: fixed-tilt, cost: { capital_per_kw: -5 } }\n`,
    ['study.yaml:3:61 mounts.ground.cost.capital_per_kw:', '-5'],
  ),
  studyCase('text in place of a number', `${weatherLine}array: { dc: twelve }\n${MOUNTS}`, [
    'study.yaml:2:14 array.dc:',
    'twelve',
  ]),
  studyCase('a number that is NaN', `${weatherLine}array: { dc: .nan }\n${MOUNTS}`, [
    'study.yaml:2:14 array.dc:',
    /nan/i,
  ]),
  studyCase('no mounts', `${weatherLine}mounts: []\n`, ['study.yaml:2:9 mounts:']),
  studyCase('mounts left out', weatherLine, ['study.yaml', 'mounts']),
  studyCase(
    'two mounts with one id',
    `${weatherLine}mounts:\n  - { id: a, kind: fixed-tilt }\n  - { id: a, kind: dual-axis }\n`,
    ['study.yaml:4', 'id', '"a"', 'line 3'],
  ),
  studyCase('an unknown kind', `${weatherLine}mounts:\n  - { id: a, kind: single-axes }\n`, [
    'study.yaml:3:20 mounts.a.kind:',
    'single-axis',
  ]),
  studyCase('an unknown key', `${weatherLine}aray: { dc: 12 kW }\n${MOUNTS}`, [
    'study.yaml:2:1 aray:',
    'array',
  ]),
  studyCase('a share without its sign', `${weatherLine}losses: { dirt: 2 }\n${MOUNTS}`, [
    'study.yaml:2:17 losses.dirt:',
    'Write 2 %',
  ]),
  studyCase('tabs in YAML', `title: x\nweather:\n\tfile: a.epw\n${MOUNTS}`, ['study.yaml:3', 'tab']),
  studyCase('a key twice', `${weatherLine}title: a\ntitle: b\n${MOUNTS}`, [
    'study.yaml:3:1',
    'title',
    'line 2',
  ]),
  studyCase(
    'an alias bomb',
    `${[...'abcdefgh']
      .map(
        (name, i, all) =>
          `${name}: &${name} [${Array(9)
            .fill(i === 0 ? 'x' : `*${all[i - 1]}`)
            .join(', ')}]`,
      )
      .join('\n')}\n${weatherLine}${MOUNTS}`,
    ['study.yaml', 'aliases'],
  ),
  studyCase('twenty thousand open brackets', '['.repeat(20_000), ['study.yaml:1', 'nested too deeply']),
];

export const BAD_WEATHER: readonly BadCase[] = [
  {
    title: 'a missing weather file',
    files: { 'study.yaml': simplestStudy('gone.epw'), 'there.epw': 'x' },
    code: 3,
    says: ['study.yaml:2:18 weather.file:', 'gone.epw', 'there.epw'],
  },
  {
    title: 'a folder in place of the weather file',
    files: { 'study.yaml': simplestStudy('year.epw'), 'year.epw/real.epw': 'x' },
    code: 3,
    says: ['study.yaml:2:18 weather.file:', 'a folder', 'real.epw'],
  },
  weatherCase('an empty weather file', '', ['year.epw', 'empty']),
  weatherCase('a binary weather file', new Uint8Array(readFileSync(process.execPath).subarray(0, 4096)), [
    'year.epw',
    'text',
  ]),
  weatherCase('a truncated year', sampleLines.slice(0, 4000).join('\n'), ['year.epw', '8,760']),
  weatherCase('a year cut off inside a line', sample.slice(0, 300_000), ['year.epw']),
  weatherCase(
    'a wrong column count',
    withLine(100, (cells) => cells.slice(0, 20)),
    ['year.epw:100', '20'],
  ),
  weatherCase('text in a number', setCell(200, GHI, 'bright'), ['year.epw:200', 'bright']),
  weatherCase('NaN in a number', setCell(300, GHI, 'NaN'), ['year.epw:300', 'NaN']),
  weatherCase(
    'a latitude of 95 in the file',
    withLine(1, (cells) => cells.with(6, '95')),
    ['year.epw:1', '95', 'from -90 to 90'],
  ),
  weatherCase('a file of no known format', 'a,b,c\n1,2,3\n', ['year.epw:1', 'EPW', 'weather.table']),
];

export const BAD_USAGE: readonly BadCase[] = [
  {
    title: 'an option that would overrule a study',
    files: { 'study.yaml': simplestStudy() },
    args: ['weather', 'study.yaml', '--label', 'start'],
    code: 2,
    says: ['study.yaml', 'weather: { label: ... }'],
  },
  { title: 'an unknown command', files: {}, args: ['comprae'], code: 2, says: ['comprae', 'compare'] },
  { title: 'an unknown option', files: {}, args: ['compare', '--jsn'], code: 2, says: ['--jsn', '--json'] },
  { title: 'no study', files: {}, args: ['compare'], code: 2, says: ['trackworth compare --demo'] },
  {
    title: 'a study and --demo',
    files: {},
    args: ['compare', 'a.yaml', '--demo'],
    code: 2,
    says: ['one study', 'a.yaml'],
  },
  {
    title: 'one argument too many',
    files: {},
    args: ['compare', 'a.yaml', 'b.yaml'],
    code: 2,
    says: ['too many arguments'],
  },
  {
    title: 'an empty --out',
    files: {},
    args: ['compare', '--demo', '--out', ''],
    code: 2,
    says: ['--out', 'name of a folder'],
  },
  {
    title: '--out without its value',
    files: {},
    args: ['compare', '--demo', '--out'],
    code: 2,
    says: ['--out', 'missing'],
  },
  { title: 'no folder to start in', files: {}, args: ['start'], code: 2, says: ['folder'] },
  { title: 'no weather file', files: {}, args: ['weather'], code: 2, says: ['file'] },
  {
    title: 'a latitude of 95 on the command line',
    files: {},
    args: ['weather', 'x.epw', '--latitude', '95'],
    code: 2,
    says: ['--latitude', 'from -90 to 90'],
  },
  {
    title: 'a number that is text',
    files: {},
    args: ['weather', 'x.epw', '--elevation', '12abc'],
    code: 2,
    says: ['--elevation', '12abc'],
  },
  {
    title: 'an unknown label',
    files: {},
    args: ['weather', 'x.epw', '--label', 'begin'],
    code: 2,
    says: ['--label', 'end, start, middle'],
  },
];
