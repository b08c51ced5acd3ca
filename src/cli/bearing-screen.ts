import type { BearingFacts } from './bearing-facts.ts';
import { placeWords, trimmed } from './figures.ts';
import { mindWords } from './mind.ts';
import { named, printable } from './plain.ts';

/** Where and when, as far as the user told. */
const origin = (f: BearingFacts): string => {
  const place =
    f.latitude_deg === null || f.longitude_deg === null
      ? ''
      : ` at ${placeWords(f.latitude_deg, f.longitude_deg)}`;
  return `${place}${f.dated === null ? '' : ` on ${f.dated}`}`;
};

const declination = (f: BearingFacts): string => {
  const size = trimmed(Math.abs(f.declination_deg));
  const side = size === '0' ? '' : f.declination_deg < 0 ? ' west' : ' east';
  const amount = `${size} ${size === '1' ? 'degree' : 'degrees'}${side}`;
  if (f.model === null) return `${amount}, as entered; its yearly change and uncertainty are not known`;
  return `${amount}${origin(f)}, by ${f.model}`;
};

const change = ({ declination_per_year_deg: perYear }: BearingFacts): string => {
  const size = trimmed(Math.abs(perYear ?? 0));
  return size === '0'
    ? 'no change to speak of'
    : `${size} degrees a year toward ${(perYear ?? 0) < 0 ? 'west' : 'east'}`;
};

/** `150 + 16 E = 166 true, south-south-east`, and what the plane faces where that is known. */
const headline = (f: BearingFacts): string => {
  const line = f.sum.endsWith('true') ? `${f.sum}, ${f.direction}` : f.sum;
  return f.azimuth_deg === null
    ? line
    : `${line}; the plane faces ${trimmed(f.azimuth_deg)} true, ${f.faces}`;
};

/** The sum, its declination and what to mind: at most 100 columns. */
export const bearingScreen = (f: BearingFacts): string => {
  const lines = [
    headline(f),
    '',
    ...f.steps.filter((step) => step !== f.sum).map((step, i) => named(i === 0 ? 'Reading' : '', step)),
    named('Declination', declination(f)),
    ...(f.model === null
      ? []
      : [
          named('Change', change(f)),
          named(
            'Uncertainty',
            `${trimmed(f.declination_uncertainty_deg ?? 0)} degrees, one standard deviation, as published for open country; local iron comes on top`,
          ),
        ]),
    ...f.findings.map(({ text, fix }) => named('Warning', printable(fix ? `${text} ${fix}` : text))),
    named('Mind', mindWords(f.cautions)),
  ];
  return `${lines.join('\n')}\n`;
};
