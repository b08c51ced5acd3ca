import type { Command } from 'commander';
import { takenOption } from './bearing-command.ts';
import { examples } from './help.ts';
import type { Io } from './io.ts';
import type { PlaneOptions } from './plane-readings.ts';
import { addWeatherOverrides } from './weather-options.ts';

const another = (file: string, before: readonly string[] = []): string[] => [...before, file];

export const addPlane = (program: Command, io: Io): void => {
  const plane = program
    .command('plane')
    .summary('roof readings and a place: tilt, true azimuth, TOF, shading, TSRF, sun hours')
    .description(
      'Turns the readings of one fixed plane into its tilt and true azimuth, and says how well it is turned to the light: TOF (its unshaded light over that of the best plane of the site) with the band that the reading errors allow, shading, TSRF (TOF less shading) and peak sun hours. The plane is a mount of a study, or is described by the options.',
    )
    .option('--study <file>', 'study that has the plane')
    .option('--mount <id>', 'its mount in that study')
    .option('--weather <file>', 'or: weather file of the place')
    .option('--tilt <slope>', 'slope 3:12, grade "25 %", or degrees')
    .option('--tilt-error <deg>', 'reading error of the tilt, either way')
    .option('--bearing <deg>', 'compass bearing, degrees clockwise from magnetic north')
    .option('--bearing-error <deg>', 'reading error of the bearing, either way')
    .option('--dated <date>', 'day of the compass reading, year-month-day')
    .option('--declination <value>', 'by hand, with its side, in place of the date: "16 E", "13 W"')
    .option('--true', 'the bearing is from true north already: no declination is applied')
    .addOption(takenOption())
    .option('--back <deg>', 'the same line read from its far end; both are averaged and compared')
    .option(
      '--downslope <side>',
      'where the roof falls, for along_ridge: left, right or roughly south, SE ...',
    )
    .option(
      '--skyline <file>',
      'table bearing,elevation, by the same north as --bearing; again for another point of the array',
      another,
    )
    .option('--json', 'print the facts as JSON');
  addWeatherOverrides(plane)
    .addHelpText(
      'beforeAll',
      examples(
        'trackworth plane --study site.yaml --mount roof',
        'trackworth plane --weather year.epw --tilt 3:12 --bearing 150 --dated 2026-05-01',
        'trackworth plane --weather year.epw --tilt "25 %" --tilt-error 2 --bearing 166 --true --skyline roof.csv',
      ),
    )
    .action(async (options: PlaneOptions) => {
      const { plane: run } = await import('./plane.ts');
      await run(options, io);
    });
};
