import { inWords } from '../../cost/index.ts';
import type { Comparison, MountResult } from '../../shared/index.ts';
import { costLack, currencyOf, hasCapital, incompleteNote, lcoeColumns } from '../cost-columns.ts';
import { md, mdList, mdTable } from '../markdown.ts';
import { formatGain, formatNumber, formatPercent, UNKNOWN } from '../numbers.ts';
import { capitalised, oneLine } from '../plain-text.ts';
import { isTracker, mountById, nameOf } from '../words.ts';
import { blocks, section } from './section.ts';

/** `drive, year 12: 800`, one after the other. */
const renewalWords = ({ renewals }: MountResult): string =>
  renewals.length === 0
    ? 'none given'
    : md(renewals.map(({ what, year, cost }) => `${what}, year ${year}: ${formatNumber(cost)}`).join('; '));

const terms = ({ finance: f }: Comparison): string =>
  `Real discount rate ${f.real_rate === null ? 'not given' : formatPercent(f.real_rate)}; life ` +
  `${f.years === null ? 'not given' : `${formatNumber(f.years)} years`}; ageing ` +
  `${f.ageing === null ? 'not given, not counted' : `${formatPercent(f.ageing, 2)} of the yield a year`}. ` +
  'Capital is paid at the start, upkeep at the end of each year, renewals at the end of their year. Cost per kWh is present cost ' +
  'over present energy.';

const lines = (c: Comparison): string => {
  const money = md(currencyOf(c));
  const costs = lcoeColumns(c);
  return mdTable(
    [
      'Mount',
      `Capital, ${money}`,
      `Capital, ${money}/kW`,
      `Upkeep, ${money}/yr`,
      `Renewals, ${money}`,
      ...costs.map(({ name }) => `${money}/kWh ${name}`),
    ],
    ['left', 'right', 'right', 'right', 'left', ...costs.map(() => 'right' as const)],
    c.mounts.map((m) => [
      md(nameOf(c, m)),
      m.capital === null ? 'not given' : formatNumber(m.capital),
      m.capital_per_kw === null ? 'not given' : formatNumber(m.capital_per_kw),
      m.upkeep_per_year === null ? 'not counted' : formatNumber(m.upkeep_per_year),
      renewalWords(m),
      ...costs.map(({ cell }) => md(cell(m))),
    ]),
  );
};

/** The cost lines of every mount, or what is lacking. */
export const cost = (c: Comparison): string => {
  const lack = costLack(c);
  const incomplete = incompleteNote(c);
  return section(
    'Costs',
    lack === null ? '' : `${md(capitalised(lack))}.`,
    hasCapital(c) ? terms(c) : '',
    hasCapital(c) ? lines(c) : '',
    incomplete === null ? '' : `${md(incomplete)}.`,
  );
};

/** Money with its sign, rounded as the sentences of the advice round it. */
const signed = (x: number | null): string => (x === null ? UNKNOWN : `${x > 0 ? '+' : ''}${inWords(x)}`);

const breakEven = (c: Comparison, trackers: readonly MountResult[]): string => {
  const known = trackers.filter((m) => m.break_even_premium_per_kw !== null || m.break_even_gain !== null);
  if (known.length === 0)
    return 'Break-even needs the costs of both mounts, a rate and a life; not counted here.';
  const reference = md(nameOf(c, mountById(c, c.reference_id)));
  const money = md(currencyOf(c));
  const or = (text: string, known: number | null, words: string) => (known === null ? words : text);
  const table = mdTable(
    [
      'Tracker',
      `Premium over ${reference} as quoted, ${money}/kW`,
      `Break-even premium, ${money}/kW`,
      `Gain over ${reference}`,
      'Break-even gain',
    ],
    ['left', 'right', 'right', 'right', 'right'],
    known.map((m) => [
      md(nameOf(c, m)),
      or(signed(m.premium_per_kw), m.premium_per_kw, 'not quoted'),
      or(signed(m.break_even_premium_per_kw), m.break_even_premium_per_kw, 'not worked out'),
      formatGain(m.gain_over_reference),
      or(formatGain(m.break_even_gain), m.break_even_gain, 'not worked out'),
    ]),
  );
  return blocks(
    `A tracker's energy costs less than that of ${reference} where its premium lies below the break-even premium, or its gain ` +
      'above the break-even gain. Upkeep and renewals are held as given.',
    table,
  );
};

const sameEnergy = (c: Comparison): string =>
  mdList(
    c.comparisons.same_energy.map(
      ({ tracker_id, text }) =>
        `In place of ${md(nameOf(c, mountById(c, tracker_id)))}, for the same energy: ${md(oneLine(text))}`,
    ),
  );

/** Each tracker against the reference: what it may cost, what it must gain, and the fixed array that equals it. */
export const trackerOrModules = (c: Comparison): string => {
  const trackers = c.mounts.filter((m) => isTracker(m) && m.id !== c.reference_id);
  if (trackers.length === 0) return '';
  return section('Tracker, or more modules?', sameEnergy(c), breakEven(c, trackers));
};

/** Gains under every sky model; isotropic is a lower bound and no part of the doubt. */
export const skySpread = (c: Comparison): string => {
  if (c.mounts.length < 2) return '';
  const reference = md(nameOf(c, mountById(c, c.reference_id)));
  return section(
    'How the sky model moves the gain',
    `Gain in delivered energy over ${reference}. The range over Perez, Hay-Davies and Reindl is part of the doubt. ` +
      'The isotropic model sees no brighter sky around the sun, so what it gives for a tracker is a lower bound and no part of the doubt.',
    mdTable(
      ['Mount', 'Perez', 'Hay-Davies', 'Reindl', 'Isotropic (lower bound)'],
      ['left', 'right', 'right', 'right', 'right'],
      c.mounts
        .filter((m) => m.id !== c.reference_id)
        .map((m) => [
          md(nameOf(c, m)),
          formatGain(m.gain_by_sky.perez),
          formatGain(m.gain_by_sky['hay-davies']),
          formatGain(m.gain_by_sky.reindl),
          formatGain(m.gain_by_sky.isotropic),
        ]),
    ),
  );
};
