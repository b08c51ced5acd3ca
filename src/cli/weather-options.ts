import { type Command, Option } from 'commander';
import type { HourLabel } from '../shared/index.ts';
import { numberBetween } from './options.ts';

/** What overrules a weather file on the command line. */
export interface WeatherOverrides {
  readonly label?: HourLabel;
  readonly latitude?: number;
  readonly longitude?: number;
  readonly elevation?: number;
  readonly utcOffset?: number;
}

/** The options of every command that reads a weather file without a study. */
export const addWeatherOverrides = (command: Command): Command => {
  const over = 'overrules the file';
  return command
    .addOption(
      new Option('--label <end|start|middle>', `what the printed times mark of their hour; ${over}`).choices([
        'end',
        'start',
        'middle',
      ]),
    )
    .option('--latitude <deg>', `north positive; ${over}`, numberBetween(-90, 90, 'degrees, north positive'))
    .option('--longitude <deg>', `east positive; ${over}`, numberBetween(-180, 180, 'degrees, east positive'))
    .option('--elevation <m>', `above sea level; ${over}`, numberBetween(-500, 9000, 'metres'))
    .option('--utc-offset <hours>', `of standard time, 5.75 or -7; ${over}`, numberBetween(-12, 14, 'hours'));
};
