import { Command, CommanderError, Option } from 'commander';
import { addBearing } from './bearing-command.ts';
import type { CompareOptions } from './compare.ts';
import { examples } from './help.ts';
import type { Io } from './io.ts';
import { folderName } from './options.ts';
import { version } from './package-files.ts';
import { addPlane } from './plane-command.ts';
import { reportTrouble } from './trouble.ts';
import type { WeatherOptions } from './weather.ts';
import { addWeatherOverrides } from './weather-options.ts';

const WRONG_USAGE = 2;

const EXIT_CODES = `
Exit codes: 0 done, 1 a fault of trackworth, 2 wrong usage, 3 an input file is wrong, 4 output could not be written.`;

const addCompare = (program: Command, io: Io): void => {
  program
    .command('compare')
    .summary('compare the mounts of a study: table on screen, report in a folder')
    .description(
      'Compares what the array of a study collects, delivers and costs on each of its mounts, and says which to choose. Prints a table and writes a report folder: memo, results, tables, charts.',
    )
    .argument('[study]', 'study file (YAML or JSON); it names its weather file')
    .option('--demo', 'compare the mounts of the sample study inside trackworth, all of it invented')
    .addOption(
      new Option(
        '--out <folder>',
        'folder for the report (default: the title of the study and -report)',
      ).argParser(folderName),
    )
    .option('--json', 'print the results as JSON; write a report only where --out says so')
    .option('--no-charts', 'leave the charts out of the report')
    .addHelpText(
      'beforeAll',
      examples(
        'trackworth compare --demo',
        'trackworth compare site.yaml',
        'trackworth compare site.yaml --out reports/site',
        'trackworth compare site.yaml --json > site.json',
      ),
    )
    .action(async (study: string | undefined, options: CompareOptions) => {
      const { compare } = await import('./compare.ts');
      await compare(study, options, io);
    });
};

const addStart = (program: Command, io: Io): void => {
  program
    .command('start')
    .summary('write a commented study and its sample weather, ready to edit')
    .description(
      'Writes study.yaml, with every key explained, and orlin.epw, the hourly year of an invented place. Never writes over a file.',
    )
    .argument('<folder>', 'new or existing folder')
    .addHelpText('beforeAll', examples('trackworth start my-site', 'trackworth compare my-site/study.yaml'))
    .action(async (folder: string) => {
      const { start } = await import('./start.ts');
      await start(folder, io);
    });
};

const addWeather = (program: Command, io: Io): void => {
  addWeatherOverrides(program.command('weather'))
    .summary('what a weather file holds and how far to trust it')
    .description(
      'Reads a weather file (EPW, TMY2 or TMY3, gzipped or not) and prints its sums and all findings: clock, closure, gaps, impossible values. A study file (.yaml, .yml, .json) stands for the weather it names, with its place, columns and clock: so a plain table is read.',
    )
    .argument('<file>', 'weather file, or a study that names one')
    .option('--json', 'print the findings as JSON')
    .addHelpText(
      'beforeAll',
      examples(
        'trackworth weather boulder.tmy2.gz',
        'trackworth weather site.yaml',
        'trackworth weather year.epw --utc-offset 5.75 --json',
      ),
    )
    .action(async (file: string, options: WeatherOptions) => {
      const { weather } = await import('./weather.ts');
      await weather(file, options, io);
    });
};

const addSchema = (program: Command, io: Io): void => {
  program
    .command('schema')
    .summary('JSON Schema of the study file, for editors')
    .description('Prints the JSON Schema of the study file: point the YAML support of your editor at it.')
    .addHelpText('beforeAll', examples('trackworth schema > study.schema.json'))
    .action(async () => {
      const { schema } = await import('./schema.ts');
      await schema(io);
    });
};

const programFor = (io: Io): Command => {
  const program = new Command('trackworth')
    .description('Is tracking worth it here? Compares the mounts that a site allows for a PV array.')
    .version(version(), '--version', 'print the version')
    .helpCommand(false)
    .exitOverride()
    .configureOutput({ writeOut: (text) => io.out(text), writeErr: (text) => io.err(text) })
    .showHelpAfterError('Run trackworth --help, or trackworth COMMAND --help, for what it takes.')
    .addHelpText('after', EXIT_CODES);
  program.addHelpText(
    'before',
    examples(
      'trackworth compare --demo            see it work on an invented site',
      'trackworth start my-site             write a study to edit',
      'trackworth compare my-site/study.yaml',
    ),
  );
  addCompare(program, io);
  addStart(program, io);
  addWeather(program, io);
  addPlane(program, io);
  addBearing(program, io);
  addSchema(program, io);
  return program;
};

/** Runs one command line (without node and script) and returns its exit code; nothing is thrown. */
export const run = async (args: readonly string[], io: Io): Promise<number> => {
  try {
    await programFor(io).parseAsync(args, { from: 'user' });
    return 0;
  } catch (error) {
    // Commander has printed its message or its help by now.
    if (error instanceof CommanderError) return error.exitCode === 0 ? 0 : WRONG_USAGE;
    return reportTrouble(error, io);
  }
};
