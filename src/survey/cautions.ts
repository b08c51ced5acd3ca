/** What to mind while surveying; general practice where no source is named. */
export const SURVEY_CAUTIONS = {
  height:
    'Falls: reading a compass or clinometer on a roof is work at height and needs fall protection under the local rule (in ' +
    'the United States from 6 ft in construction and 4 ft in upkeep, OSHA); sight from the ground where you can.',
  iron:
    'Compass: keep away from iron and from conductors that carry current; nails, racks, vehicles, tools, belt buckles, ' +
    'cables and running inverters turn the needle by many degrees, and no declination puts that right.',
  metalRoof:
    'Metal roof: do not read a compass on it or beside it; take the bearing from the ground or from a map.',
  phone:
    'Phone compass: calibrate it away from metal and magnetic cases, and check whether it shows true or magnetic north ' +
    'before declination is applied to it.',
  declinationOnce:
    'Declination is applied once, here, to magnetic readings; a compass or a phone that is already set to true north must be ' +
    'entered as true.',
  levelRun:
    'Slope: the run of a roof is measured level; a tape laid along the rafter gives a smaller slope than the true one.',
  skylineFrom:
    'Skyline: take elevation angles from the lowest point of the array, and never sight the sun itself; leaves, growth and new ' +
    'buildings change it.',
} as const;

export interface Surveyed {
  /** A compass was used. */
  readonly compass: boolean;
  /** The plane is a roof. */
  readonly roof: boolean;
  /** Slope from rise and run. */
  readonly riseAndRun: boolean;
  readonly skyline: boolean;
}

/** The cautions that go with what was surveyed, in the order of the work. */
export const surveyCautions = ({ compass, roof, riseAndRun, skyline }: Surveyed): string[] => [
  ...(roof ? [SURVEY_CAUTIONS.height] : []),
  ...(compass ? [SURVEY_CAUTIONS.iron] : []),
  ...(compass && roof ? [SURVEY_CAUTIONS.metalRoof] : []),
  ...(compass ? [SURVEY_CAUTIONS.phone, SURVEY_CAUTIONS.declinationOnce] : []),
  ...(riseAndRun ? [SURVEY_CAUTIONS.levelRun] : []),
  ...(skyline ? [SURVEY_CAUTIONS.skylineFrom] : []),
];
