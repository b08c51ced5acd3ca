import { type Command, Option } from 'commander';
import type { BearingOptions } from './bearing-request.ts';
import { examples } from './help.ts';
import type { Io } from './io.ts';
import { numberBetween } from './options.ts';

/** The ways of taking a bearing, named here so that help does not load the survey. */
export const takenOption = (): Option =>
  new Option(
    '--taken <how>',
    'facing out from the plane, looking_at it, or along_ridge (or eave): the tool turns it',
  ).choices(['facing', 'looking_at', 'along_ridge']);

export const addBearing = (program: Command, io: Io): void => {
  program
    .command('bearing')
    .summary('magnetic bearing to true and back, with the sum written out')
    .description(
      'Turns a compass bearing to true north (or back) by the declination at a place and date, from the World Magnetic Model, or by one entered by hand. No clock is asked: the date is that of the reading.',
    )
    .argument('<deg>', 'bearing, degrees clockwise from north')
    .option('--at <lat,lon>', 'place: degrees, north and east positive; south or west as --at=-33.9,18.4')
    .option(
      '--elevation <m>',
      'of the place above sea level; it moves a declination by hundredths of a degree',
      numberBetween(-500, 9000, 'metres'),
    )
    .option('--dated <date>', 'day of the reading, year-month-day')
    .addOption(
      new Option('--to <north>', 'which bearing is wanted').choices(['true', 'magnetic']).default('true'),
    )
    .option('--declination <value>', 'by hand, with its side, in place of the model: "16 E", "13 W"')
    .option('--back <deg>', 'the same line read from its far end; both are averaged and compared')
    .addOption(takenOption())
    .option(
      '--downslope <side>',
      'where the roof falls, for along_ridge: left, right or roughly south, SE ...',
    )
    .option('--json', 'print the facts as JSON')
    .addHelpText(
      'beforeAll',
      examples(
        'trackworth bearing 150 --at 45.6,-121.2 --dated 2026-05-01',
        'trackworth bearing 180 --to magnetic --at=-33.9,18.4 --dated 2026-05-01',
        'trackworth bearing 150 --declination "16 E" --taken looking_at',
        'trackworth bearing 240 --back 61 --declination "13 W" --taken along_ridge --downslope south',
      ),
    )
    .action(async (deg: string, options: BearingOptions) => {
      const { bearing } = await import('./bearing.ts');
      await bearing(deg, options, io);
    });
};
