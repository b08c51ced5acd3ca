import { describe, expect, test } from 'vitest';
import { HOURS, MONTH_FIRST_DAY, type Place, yearlySum } from '../../src/shared/index.ts';
import { type SunHours, sunOverHours, sunPosition } from '../../src/sun/index.ts';
import { seeded, Worst } from '../shared/seeded.ts';

const DEG = Math.PI / 180;
const everyDay = (year: number) => new Array<number>(365).fill(year);
const at = (latitudeDeg: number, longitudeDeg = 0, utcOffsetH = 0): Place => ({
  latitudeDeg,
  longitudeDeg,
  elevationM: 0,
  utcOffsetH,
});

/** UTC at which hour `h` of a 365-day year begins. */
const hourBegins = (place: Place, calendarYear: number, h: number, offsetMin: number): number => {
  const day = Math.floor(h / 24);
  const month = MONTH_FIRST_DAY.findLastIndex((first) => first <= day);
  const date = Date.UTC(calendarYear, month, day - MONTH_FIRST_DAY[month] + 1, h % 24);
  return date + offsetMin * 60_000 - place.utcOffsetH * 3_600_000;
};

/** Direction cosines of the sun seen from the earth's centre: `sunPosition` with its parallax taken out again. */
const direction = (utcMs: number, place: Place): [number, number, number] => {
  const sun = sunPosition(utcMs, place.latitudeDeg, place.longitudeDeg);
  const zenith = (sun.zenithDeg - (8.794 / 3600 / sun.distanceAu) * Math.sin(sun.zenithDeg * DEG)) * DEG;
  const azimuth = sun.azimuthDeg * DEG;
  return [Math.sin(zenith) * Math.sin(azimuth), Math.sin(zenith) * Math.cos(azimuth), Math.cos(zenith)];
};

/** Parts of `begin .. begin + 1 h` with the sun's centre up, to a tenth of a second: [from, to] in UTC. */
const sunlitParts = (begin: number, place: Place): [number, number][] => {
  const up = (utcMs: number) => direction(utcMs, place)[2] > 0;
  const edges: number[] = [begin];
  for (let minute = 0; minute < 60; minute++) {
    let [low, high] = [begin + minute * 60_000, begin + (minute + 1) * 60_000];
    if (up(low) === up(high)) continue;
    const before = up(low);
    while (high - low > 100) {
      const middle = (low + high) / 2;
      if (up(middle) === before) low = middle;
      else high = middle;
    }
    edges.push(high);
  }
  edges.push(begin + 3_600_000);
  const parts: [number, number][] = [];
  for (let i = 0; i + 1 < edges.length; i++)
    if (up((edges[i] + edges[i + 1]) / 2)) parts.push([edges[i], edges[i + 1]]);
  return parts;
};

const angleBetween = (sun: SunHours, s: number, v: readonly number[]): number => {
  const chord = Math.hypot(sun.east[s] - v[0], sun.north[s] - v[1], sun.up[s] - v[2]);
  return (2 * Math.asin(chord / 2)) / DEG;
};

const faultsOfSamples = (sun: SunHours) => {
  const faults = { down: 0, notUnit: 0, wrongCount: 0, wrongMean: 0 };
  for (let h = 0; h < HOURS; h++) {
    let sum = 0;
    for (let s = sun.first[h]; s < sun.first[h + 1]; s++) {
      if (!(sun.up[s] > 0)) faults.down++;
      if (!(Math.abs(Math.hypot(sun.east[s], sun.north[s], sun.up[s]) - 1) < 1e-12)) faults.notUnit++;
      sum += sun.up[s];
    }
    const count = sun.first[h + 1] - sun.first[h];
    if (count !== (sun.sunlit[h] > 0 ? 4 : 0)) faults.wrongCount++;
    if (!(Math.abs(sun.cosZenith[h] - (count ? sum / count : 0)) < 1e-12)) faults.wrongMean++;
  }
  return faults;
};

describe('samples of the sun within the hour', () => {
  test('agree with the sun at the same instants for random places, years, offsets and half-hour zones', () => {
    const random = seeded(7);
    const [sample, edge, centre, share] = [new Worst(), new Worst(), new Worst(), new Worst()];
    for (let round = 0; round < 12; round++) {
      const longitude = 360 * random() - 180;
      // Whole, half and quarter hours, up to two hours off the sun as real zones are.
      const utcOffsetH = (Math.round((longitude / 15) * 4) + Math.round(16 * random() - 8)) / 4;
      const place = at(180 * random() - 90, longitude, utcOffsetH);
      const calendarYear = 1990 + Math.floor(61 * random());
      const offsetMin = Math.round(300 * random() - 150);
      const sun = sunOverHours(place, everyDay(calendarYear), offsetMin);
      const where = `latitude ${place.latitudeDeg.toFixed(1)}, ${calendarYear}, ${offsetMin} min`;
      for (let i = 0; i < 150; i++) {
        const h = Math.floor(HOURS * random());
        const begin = hourBegins(place, calendarYear, h, offsetMin);
        const parts = sunlitParts(begin, place);
        const lit = parts.reduce((sum, [from, to]) => sum + to - from, 0);
        share.note(
          (sun.sunlit[h] - lit / 3_600_000) * Math.cos(place.latitudeDeg * DEG),
          `${where}, hour ${h}`,
        );
        const count = sun.first[h + 1] - sun.first[h];
        if (count === 0 || parts.length !== 1 || lit < 60_000) continue;
        const mean = [0, 0, 0];
        for (let k = 0; k < count; k++) {
          const v = direction(parts[0][0] + ((k + 0.5) * lit) / count, place);
          const off = angleBetween(sun, sun.first[h] + k, v);
          if (lit > 3_599_000) sample.note(off, `${where}, hour ${h}`);
          else edge.note(off * Math.cos(place.latitudeDeg * DEG), `${where}, hour ${h}`);
          const s = sun.first[h] + k;
          [sun.east[s] - v[0], sun.north[s] - v[1], sun.up[s] - v[2]].forEach((d, j) => {
            mean[j] += d / count;
          });
        }
        if (lit > 3_599_000) centre.note(Math.hypot(...mean) / DEG, `${where}, hour ${h}`);
      }
    }
    sample.print('one sample of a fully lit hour, degrees');
    edge.print('one sample of a sunrise or sunset hour times cos(latitude), degrees');
    centre.print('mean of the samples of a fully lit hour, degrees');
    share.print('sunlit share of an hour times cos(latitude)');
    expect(sample.count).toBeGreaterThan(2500);
    expect(share.count).toBe(1800);
    // Declination and the equation of time are held at their mid-hour values: up to 0.0083 + 0.0026 degrees at the
    // hour's ends, which cancel over the hour.
    expect(sample.size).toBeLessThan(0.011);
    expect(centre.size).toBeLessThan(0.0002);
    // Those 0.011 degrees also move sunrise: by 3 s where the sun crosses the horizon steeply, longer on a slanting path.
    expect(edge.count).toBeGreaterThan(200);
    expect(edge.size).toBeLessThan(0.03);
    expect(share.size).toBeLessThan(0.003);
  });

  test('have the sun up in every one, and their mean is the cosine of the zenith', () => {
    for (const latitude of [-90, -70, -35, 0, 23, 52, 66.5, 67, 80, 90]) {
      const sun = sunOverHours(at(latitude, 10, 1), everyDay(2023));
      expect(sun.first[HOURS]).toBe(sun.up.length);
      expect(faultsOfSamples(sun)).toEqual({ down: 0, notUnit: 0, wrongCount: 0, wrongMean: 0 });
      // Half the year, a little more north of the equator, where summer is the longer half.
      expect(yearlySum(sun.sunlit) / HOURS).toBeGreaterThan(0.485);
      expect(yearlySum(sun.sunlit) / HOURS).toBeLessThan(0.515);
    }
  });
});

describe('the sunlit share', () => {
  test('of a day adds up to its geometric length, 2 acos(-tan latitude tan declination) / 15 hours', () => {
    const worst = new Worst();
    for (const latitude of [-55, -35, 0, 20, 40, 60]) {
      const place = at(latitude, 0, 0);
      const sun = sunOverHours(place, everyDay(2019));
      for (let day = 0; day < 365; day++) {
        const noon = sunPosition(hourBegins(place, 2019, day * 24 + 12, 0), latitude, 0);
        const half = Math.acos(-Math.tan(latitude * DEG) * Math.tan(noon.declinationDeg * DEG));
        let hours = 0;
        for (let h = day * 24; h < day * 24 + 24; h++) hours += sun.sunlit[h];
        worst.note((hours - (2 * half) / DEG / 15) * 3600, `latitude ${latitude}, day ${day}`);
      }
    }
    worst.print('length of the day, s');
    expect(worst.count).toBe(6 * 365);
    // The true sun is slower or faster than 15 degrees an hour by up to 30 s a day, and noon is not quite 12:00.
    expect(worst.size).toBeLessThan(25);
  });

  test('is 1 all day in the polar summer and 0 in the polar night', () => {
    const sun = sunOverHours(at(75, 25, 2), everyDay(2026));
    const [june, december] = [171 * 24, 354 * 24];
    for (let h = 0; h < 24; h++) {
      expect(sun.sunlit[june + h]).toBe(1);
      expect(sun.sunlit[december + h]).toBe(0);
      expect(sun.first[december + h + 1]).toBe(sun.first[december + h]);
    }
    const south = sunOverHours(at(-75, 25, 2), everyDay(2026));
    expect(south.sunlit[june + 12]).toBe(0);
    expect(south.sunlit[december]).toBe(1);
  });

  test('of an hour that holds the last light of one day and the first of the next counts both', () => {
    // 67 degrees north, the clock set so that the sun's midnight falls into the middle of an hour.
    const place = at(67, 7.5, 0);
    const sun = sunOverHours(place, everyDay(2026), 0, 40);
    let seen = 0;
    for (let day = 120; day < 230; day++)
      for (const h of [day * 24 + 23, day * 24]) {
        const begin = hourBegins(place, 2026, h, 0);
        const parts = sunlitParts(begin, place);
        if (parts.length < 2 || parts[1][0] - parts[0][1] < 300_000) continue;
        seen++;
        const lit = parts.reduce((sum, [from, to]) => sum + to - from, 0) / 3_600_000;
        // Near the pole the sun grazes the horizon: 0.01 degrees of declination move the edge by a minute or more.
        expect(Math.abs(sun.sunlit[h] - lit)).toBeLessThan(0.1);
        // The samples lie on both sides of the lowest point: the sun is west of north before it and east after it.
        const easts = Array.from(sun.east.subarray(sun.first[h], sun.first[h + 1]));
        expect(easts.length).toBe(40);
        const before = easts.filter((e) => e < 0).length;
        expect(before).toBeGreaterThan(0);
        expect(before).toBeLessThan(40);
        const gap = easts.slice(1).map((e, i) => e - easts[i]);
        expect(Math.max(...gap)).toBeGreaterThan(3 * Math.min(...gap));
      }
    expect(seen).toBeGreaterThan(0);
  });
});

test('an hour begun later is the same hour of a sky that turned on', () => {
  const place = at(40, -105, -7);
  const [early, late] = [sunOverHours(place, everyDay(2001)), sunOverHours(place, everyDay(2001), 60)];
  for (let h = 30; h < 8700; h += 7) {
    expect(Math.abs(late.cosZenith[h] - early.cosZenith[h + 1])).toBeLessThan(2e-5);
    expect(Math.abs(late.sunlit[h] - early.sunlit[h + 1])).toBeLessThan(2e-3);
  }
});

test('typical years sewn from months of different calendar years take each day from its own', () => {
  const place = at(40, -105, -7);
  const mixed = everyDay(1996).map((year, day) => (day < 59 ? year : 2003));
  const [a, b, both] = [1996, 2003, null].map((y) => sunOverHours(place, y ? everyDay(y) : mixed));
  expect(both.cosZenith[58 * 24 + 12]).toBe(a.cosZenith[58 * 24 + 12]);
  expect(both.cosZenith[59 * 24 + 12]).toBe(b.cosZenith[59 * 24 + 12]);
  expect(a.cosZenith[59 * 24 + 12]).not.toBe(b.cosZenith[59 * 24 + 12]);
});
