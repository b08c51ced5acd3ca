import type { Comparison, MountResult } from '../../shared/index.ts';
import { compassWords } from '../../shared/index.ts';
import { SURVEY_CAUTIONS } from '../../survey/index.ts';
import { md, mdList, mdTable } from '../markdown.ts';
import { formatNumber, formatPercent, UNKNOWN } from '../numbers.ts';
import { angleWords, surveyed } from '../survey-words.ts';
import { nameOf } from '../words.ts';
import { blocks, section } from './section.ts';

const lines = (texts: readonly string[]): string => (texts.length === 0 ? UNKNOWN : texts.map(md).join('; '));

const azimuthWords = (m: MountResult): string =>
  m.azimuth_deg === null
    ? UNKNOWN
    : `${angleWords(m.azimuth_deg, m.azimuth_error_deg)} (${compassWords(m.azimuth_deg)})`;

const readingTable = (c: Comparison, mounts: readonly MountResult[]): string =>
  mounts.length === 0
    ? ''
    : mdTable(
        ['Mount', 'As read', 'How the angles follow', 'Tilt', 'True azimuth'],
        ['left', 'left', 'left', 'right', 'right'],
        mounts.map((m) => [
          md(nameOf(c, m)),
          lines(m.readings),
          lines(m.survey_steps),
          angleWords(m.tilt_deg, m.tilt_error_deg),
          azimuthWords(m),
        ]),
      );

/** Said here and nowhere else in the memo, so that nobody applies a declination twice. */
const declination = ({ declinations }: Comparison): string =>
  declinations.length === 0
    ? 'No magnetic bearing was read: no declination was applied.'
    : blocks(
        'Declination applied to magnetic bearings:',
        mdList(declinations.map((text) => md(text))),
        `**The azimuths of this memo are true. ${md(SURVEY_CAUTIONS.declinationOnce)}**`,
      );

const errorsGiven = (m: MountResult): string =>
  [
    m.tilt_error_deg === null ? '' : `±${formatNumber(m.tilt_error_deg, 1)}° of tilt`,
    m.azimuth_error_deg === null ? '' : `±${formatNumber(m.azimuth_error_deg, 1)}° of azimuth`,
  ]
    .filter((text) => text !== '')
    .join(' and ');

/** What the reading errors do to the orientation factor. */
const bandWords = (c: Comparison, m: MountResult): string[] => {
  if (m.orientation_factor === null) return [];
  const name = md(nameOf(c, m));
  if (m.orientation_factor_band === null)
    return [`${name}: no reading error is given, so how far its TOF may be out is not known.`];
  const { low, high } = m.orientation_factor_band;
  return [
    `${name}: ${errorsGiven(m)} leave TOF between ${formatPercent(low)} and ${formatPercent(high)}; as read it is ` +
      `${formatPercent(m.orientation_factor)}.`,
  ];
};

/** What was read on site beside the angles that follow from it; nothing where nothing was read. */
export const readings = (c: Comparison): string => {
  const mounts = surveyed(c);
  if (mounts.length === 0 && c.declinations.length === 0) return '';
  const bands = mounts.flatMap((m) => bandWords(c, m));
  return section(
    'Readings on site',
    readingTable(c, mounts),
    declination(c),
    bands.length > 0 ? 'What the reading errors do to the orientation factor (TOF):' : '',
    mdList(bands),
  );
};
