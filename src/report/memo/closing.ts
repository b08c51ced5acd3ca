import type { Comparison } from '../../shared/index.ts';
import type { ReportExtras } from '../extras.ts';
import { md, mdTable } from '../markdown.ts';
import { oneLine } from '../plain-text.ts';
import { cautionsOfSurvey } from '../survey-words.ts';
import { figure } from './overview.ts';
import { blocks, section } from './section.ts';
import { sentences } from './sentences.ts';

/** What the figures leave out, and what might be wrong with them. */
export const notCountedAndDoubts = (c: Comparison): string =>
  blocks(
    section(
      'Not counted',
      c.not_counted.length === 0
        ? 'Nothing that the study leaves blank was left out.'
        : blocks(
            'What the study leaves blank is not counted, and is not zero. The effect is what one plausible value would do.',
            mdTable(
              ['Left blank', 'Effect'],
              ['left', 'left'],
              c.not_counted.map(({ what, effect }) => [
                md(what),
                effect ? md(oneLine(effect)) : 'not worked out',
              ]),
            ),
          ),
    ),
    section('Doubts', sentences(c, c.advice.doubts)),
  );

/** For whoever builds and keeps it. */
export const cautions = (c: Comparison): string =>
  section('Cautions', sentences(c, [...new Set([...c.advice.cautions, ...cautionsOfSurvey(c)])]));

/** Everything that a reviewer needs to repeat the work. */
export const appendix = (
  c: Comparison,
  { version, chartFiles, inputs }: ReportExtras,
  shown: readonly string[],
): string =>
  blocks(
    section('More charts', ...chartFiles.filter(({ name }) => !shown.includes(name)).map(figure)),
    section(
      'Assumptions',
      mdTable(
        ['What', 'Value', 'Source'],
        ['left', 'left', 'left'],
        c.assumptions.map(({ what, value, source }) => [md(what), md(value), md(source)]),
      ),
    ),
    section('Inputs', inputTable(inputs), provenance(c, version)),
  );

const inputTable = (inputs: ReportExtras['inputs']): string =>
  inputs.length === 0
    ? ''
    : mdTable(
        ['File', 'SHA-256'],
        ['left', 'left'],
        inputs.map(({ name, sha256 }) => [md(name), md(sha256)]),
      );

const provenance = (c: Comparison, version: string): string =>
  `Written by trackworth ${md(version)} from the results in results.json (${md(c.schema)}). The same inputs give the same report. ` +
  'A typical year is neither a bad year nor a design wind, and no yield is guaranteed.';
