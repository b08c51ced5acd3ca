import type { CostSpec } from '../cost/index.ts';
import type { ArraySpec, DriveSpec, StuckAt } from '../energy/index.ts';
import {
  axisTiltOnSlope,
  type DualAxis,
  type MountGeometry,
  type MountLengths,
  type RowSpec,
  type SingleAxis,
} from '../mounts/index.ts';
import type { TableColumn, TableColumns } from '../weather/index.ts';
import type { StowSpec, WindSpec } from '../wind/index.ts';
import { DEFAULT_ALBEDO, DEFAULT_AXIS_AZIMUTH_DEG, DEFAULT_SWING_DEG } from './defaults.ts';
import type { Side } from './fields/angles.ts';
import type { RawMount } from './schema/mounts.ts';
import { monthlyShares } from './schema/snow.ts';
import type { RawStudy } from './schema/study.ts';
import { sideTurn } from './side-turn.ts';
import type { MountReadings, Study, StudyMount } from './study-file.ts';
import { readingsOf, skylinesOf } from './to-readings.ts';

/** Only single-axis rows turn back; other rows take the shade as it falls. */
const rowsOf = (
  rows: { gcr: number; low_sun?: 'backtrack' | 'shade' | undefined } | undefined,
  otherwise: RowSpec['lowSun'],
): RowSpec | null => (rows ? { gcr: rows.gcr, lowSun: rows.low_sun ?? otherwise } : null);

/** A roof has each angle outright or as read on site: checked before. */
const known = (angleDeg: number | undefined): number => {
  if (angleDeg === undefined) throw new RangeError('a roof without its angles');
  return angleDeg;
};

type RawSingleAxis = Extract<RawMount, { kind: 'single-axis' }>;

/** What the ground says of a tracker on it: the tilt of its axis is never given beside it (checked before). */
const onGround = ({ axis, ground, slope_limits }: RawSingleAxis): Partial<SingleAxis> => ({
  ...(ground && {
    axisTiltDeg: axisTiltOnSlope(
      ground.slope,
      ground.falls_toward,
      axis?.azimuth ?? DEFAULT_AXIS_AZIMUTH_DEG,
    ),
    ground: { slopeDeg: ground.slope, fallsTowardDeg: ground.falls_toward },
  }),
  ...(slope_limits && {
    slopeLimits: { alongDeg: slope_limits.along ?? null, acrossDeg: slope_limits.across ?? null },
  }),
});

type RawMast = Extract<RawMount, { kind: 'dual-axis' | 'turntable' }>;

/** Where a mast can face; what is blank is left out. */
const reachOf = (mount: RawMast): Pick<DualAxis, 'turns' | 'elevation'> => ({
  ...(mount.turns && { turns: { fromDeg: mount.turns.from, toDeg: mount.turns.to } }),
  ...('elevation' in mount &&
    mount.elevation && {
      elevation: { lowestDeg: mount.elevation.lowest ?? 0, highestDeg: mount.elevation.highest ?? 90 },
    }),
});

const geometryOf = (mount: RawMount, readings: MountReadings | null): MountGeometry => {
  switch (mount.kind) {
    case 'roof-plane':
      return {
        kind: mount.kind,
        tiltDeg: readings?.slope ? readings.slope.tiltDeg : known(mount.tilt),
        azimuthDeg: readings?.bearing ? 'surveyed' : known(mount.azimuth),
      };
    case 'fixed-tilt':
      return {
        kind: mount.kind,
        tiltDeg: readings?.slope ? readings.slope.tiltDeg : (mount.tilt ?? 'best'),
        azimuthDeg: readings?.bearing ? 'surveyed' : (mount.azimuth ?? 'best'),
        rows: rowsOf(mount.rows, 'shade'),
      };
    case 'single-axis':
      return {
        kind: mount.kind,
        axisAzimuthDeg: mount.axis?.azimuth ?? DEFAULT_AXIS_AZIMUTH_DEG,
        axisTiltDeg: mount.axis?.tilt ?? 0,
        swingDeg: mount.swing ?? DEFAULT_SWING_DEG,
        rows: rowsOf(mount.rows, 'backtrack'),
        ...(mount.cloudy === 'flat' && { cloudy: mount.cloudy }),
        ...onGround(mount),
      };
    case 'dual-axis':
      return { kind: mount.kind, rows: rowsOf(mount.rows, 'shade'), ...reachOf(mount) };
    case 'turntable':
      return {
        kind: mount.kind,
        planeTiltDeg: mount.tilt ?? 'best',
        rows: rowsOf(mount.rows, 'shade'),
        ...reachOf(mount),
      };
  }
};

const lengthsOf = (mount: RawMount): MountLengths => ({
  slantM: ('slant' in mount ? mount.slant : null) ?? null,
  axisHeightM: ('axis_height' in mount ? mount.axis_height : null) ?? null,
  lowerEdgeM: ('lower_edge' in mount ? mount.lower_edge : null) ?? null,
  airBehindM: ('air_behind' in mount ? mount.air_behind : null) ?? null,
});

type RawTracker = Extract<RawMount, { kind: 'single-axis' | 'dual-axis' | 'turntable' }>;

/** A turn with its sign from the side that it faces, once the axis is known. */
const signed = (mount: RawTracker, turnDeg: number, faces: Side | undefined): number => {
  const azimuthDeg = mount.kind === 'single-axis' ? mount.axis?.azimuth : undefined;
  return (faces && sideTurn(turnDeg, faces, azimuthDeg ?? DEFAULT_AXIS_AZIMUTH_DEG)) ?? turnDeg;
};

const stuckOf = (mount: RawTracker): StuckAt | null => {
  const stuck = mount.drive?.stuck;
  if (stuck === undefined || typeof stuck === 'string') return stuck ?? null;
  if ('tilt' in stuck) return { tiltDeg: stuck.tilt, azimuthDeg: stuck.azimuth };
  return { turnDeg: signed(mount, stuck.turn, stuck.faces) };
};

const stowOf = (mount: RawMount): StowSpec | null => {
  if (!('stow' in mount) || !mount.stow) return null;
  const { stow } = mount;
  return {
    gustMs: stow.gust,
    gustFactor: stow.gust_factor ?? null,
    releaseMs: stow.release ?? null,
    holdH: stow.hold ?? 0,
    angleDeg: signed(mount, stow.angle ?? 0, 'faces' in stow ? stow.faces : undefined),
  };
};

/** Every tracker has a drive, even where the study says nothing of it. */
const driveOf = (mount: RawMount): DriveSpec | null =>
  mount.kind === 'single-axis' || mount.kind === 'dual-axis' || mount.kind === 'turntable'
    ? {
        working: mount.drive?.working ?? null,
        stuck: stuckOf(mount),
        visits: mount.drive?.visits ?? null,
        ownUse: mount.drive?.own_use ?? null,
      }
    : null;

const costOf = ({ cost }: RawMount): CostSpec | null => {
  if (!cost || Object.values(cost).every((value) => value === undefined)) return null;
  return {
    capitalPerKw: cost.capital_per_kw ?? null,
    capital: cost.capital ?? null,
    upkeepPerKw: cost.upkeep_per_kw ?? null,
    upkeep: cost.upkeep ?? null,
    renewals: cost.renewals ?? [],
  };
};

const mountOf = (mount: RawMount): StudyMount => {
  const readings = 'bearing' in mount || 'slope' in mount ? readingsOf(mount) : null;
  return {
    id: mount.id,
    label: mount.label ?? mount.id,
    geometry: geometryOf(mount, readings),
    readings,
    lengths: lengthsOf(mount),
    drive: driveOf(mount),
    stow: stowOf(mount),
    snow: mount.snow === undefined ? null : monthlyShares(mount.snow),
    cost: costOf(mount),
  };
};

const arrayOf = (array: RawStudy['array']): ArraySpec => ({
  given: array !== undefined,
  dcKw: array?.dc ?? 1,
  inverterKw: array?.inverter ?? null,
  module: array?.module
    ? {
        powerW: array.module.power,
        lengthM: array.module.length ?? null,
        widthM: array.module.width ?? null,
        thicknessM: array.module.thickness ?? null,
        heatPerK: array.module.heat ?? null,
      }
    : null,
});

type RawColumn = string | { column: string; unit?: string | undefined };
const columnOf = (raw: RawColumn): TableColumn =>
  typeof raw === 'string' ? { name: raw, unit: null } : { name: raw.column, unit: raw.unit ?? null };

const tableOf = (table: RawStudy['weather']['table']): TableColumns | null => {
  if (!table) return null;
  const orNull = (raw: RawColumn | undefined) => (raw === undefined ? null : columnOf(raw));
  return {
    time: columnOf(table.time),
    ghi: orNull(table.ghi),
    dni: orNull(table.dni),
    dhi: orNull(table.dhi),
    temperature: orNull(table.temperature),
    wind: orNull(table.wind),
  };
};

const windOf = (wind: RawStudy['wind']): WindSpec | null => {
  const spec: WindSpec = {
    designGustMs: wind?.design_gust ?? null,
    exposure: wind?.exposure ?? null,
    limits: { roofProjectionM: wind?.limits?.roof_projection ?? null, heightM: wind?.limits?.height ?? null },
  };
  const given = [spec.designGustMs, spec.exposure, ...Object.values(spec.limits)].some(
    (value) => value !== null,
  );
  return given ? spec : null;
};

/** The last part of a path without its ending: `sites/orlin.yaml` gives `orlin`. */
const nameOf = (file: string): string => {
  const last = file.split(/[\\/]/).at(-1) ?? '';
  return last.replace(/\.[^.]+$/, '') || 'study';
};

/** Fills the documented defaults in; all else that is blank becomes null. */
export const toStudy = (frame: RawStudy, mounts: readonly RawMount[], file: string): Study => ({
  title: frame.title ?? nameOf(file),
  site: {
    latitudeDeg: frame.site?.latitude ?? null,
    longitudeDeg: frame.site?.longitude ?? null,
    elevationM: frame.site?.elevation ?? null,
    utcOffsetH: frame.site?.utc_offset ?? null,
    roofHeightM: frame.site?.roof_height ?? null,
    skyline: skylinesOf(frame.site?.skyline),
  },
  weather: {
    file: frame.weather.file,
    table: tableOf(frame.weather.table),
    label: frame.weather.label ?? null,
    addMinutes: frame.weather.add_minutes ?? 0,
    acceptClock: frame.weather.accept_clock ?? false,
  },
  sky: { model: frame.sky?.model ?? 'perez', albedo: frame.sky?.albedo ?? DEFAULT_ALBEDO },
  array: arrayOf(frame.array),
  mounts: mounts.map(mountOf),
  losses: {
    dirt: frame.losses?.dirt ?? null,
    moduleSpread: frame.losses?.module_spread ?? null,
    cables: frame.losses?.cables ?? null,
    conversion: frame.losses?.conversion ?? null,
  },
  finance: {
    realRate: frame.finance?.real_rate ?? null,
    years: frame.finance?.years ?? null,
    ageing: frame.finance?.ageing ?? null,
    currency: frame.finance?.currency ?? null,
  },
  wind: windOf(frame.wind),
  objective: frame.advice?.objective ?? null,
  programme: {
    minimumTof: frame.advice?.minimum_tof ?? null,
    minimumTsrf: frame.advice?.minimum_tsrf ?? null,
  },
  compareWith: frame.compare_with ?? null,
});
