import { expect, test } from 'vitest';
import { monthlySums, yearlySum } from '../../src/shared/index.ts';
import { describeWithWeather, realRawYear, realYear, realYearNames } from '../support/real-years.ts';

/**
 * Sums of the files' own columns, made with zcat and awk (substr of the manual's columns, or field numbers), not with
 * trackworth: GHI, DNI, DHI in Wh/m2; temperature in degrees C and wind in m/s summed over the hours.
 */
const AWK: Record<string, readonly [number, number, number, number, number]> = {
  'AZ-Phoenix.tmy2.gz': [2116976, 2518615, 565682, 197337.7, 26143.3],
  'AK-Fairbanks.tmy2.gz': [933413, 1058563, 495102, -26892.3, 21948.7],
  'PI-Guam.tmy2.gz': [1850122, 1406240, 899047, 227382.3, 36838.4],
  '722190.tmy3.gz': [1685866, 1580374, 721388, 145879.4, 35375.3],
  '725650.tmy3.gz': [1670220, 1977576, 556451, 95268, 34308.8],
  '700260.tmy3.gz': [713443, 674505, 461656, -103515.4, 47692.7],
  '725650-denver.epw.gz': [1670220, 1977576, 556451, 95268, 34308.8],
};

describeWithWeather('real weather files', () => {
  test.each(Object.entries(AWK))(
    '%s sums to what awk makes of it',
    async (name, [ghi, dni, dhi, temperature, wind]) => {
      const raw = await realRawYear(name);
      expect([raw.ghi, raw.dni, raw.dhi].map(yearlySum)).toEqual([ghi, dni, dhi]);
      expect(yearlySum(raw.temperatureC as Float64Array)).toBeCloseTo(temperature, 3);
      expect(yearlySum(raw.windMs as Float64Array)).toBeCloseTo(wind, 3);
    },
  );

  test('every file is complete: three components, temperature, wind, nothing repaired', async () => {
    const names = realYearNames();
    expect(names.length).toBeGreaterThanOrEqual(16);
    for (const name of names) {
      const year = await realYear(name);
      expect(year.origin).toEqual({ ghi: 'given', dni: 'given', dhi: 'given' });
      expect(year.temperatureC && year.windMs).toBeTruthy();
      expect(year.calendarYear.every((y) => y >= 1961 && y <= 2005)).toBe(true);
      const repairs = year.notes.filter((n) => n.code !== 'no-albedo').map((n) => n.code);
      expect(repairs).toEqual([]);
    }
  });

  test('the EPW and the TMY3 of Denver are the same year, hour by hour', async () => {
    const [epw, tmy3] = [await realYear('725650-denver.epw.gz'), await realYear('725650.tmy3.gz')];
    expect(epw.ghi).toEqual(tmy3.ghi);
    expect(epw.dni).toEqual(tmy3.dni);
    expect(epw.dhi).toEqual(tmy3.dhi);
    expect(epw.calendarYear).toEqual(tmy3.calendarYear);
    expect(epw.place).toEqual(tmy3.place);
    const apart = (a: Float64Array | null, b: Float64Array | null) =>
      (a as Float64Array).reduce((w, v, h) => Math.max(w, Math.abs(v - (b as Float64Array)[h])), 0);
    // Both files print tenths.
    expect(apart(epw.temperatureC, tmy3.temperatureC)).toBeLessThan(0.051);
    expect(apart(epw.windMs, tmy3.windMs)).toBeLessThan(0.051);
    expect(tmy3.albedo?.[0]).toBe(0.22);
    expect(epw.albedo).toBeNull(); // this EPW file has 0 in every row
  });

  test('Phoenix stands where the station line says: N 33 26, W 112 1, 339 m, UTC-7', async () => {
    const { place, station } = await realRawYear('AZ-Phoenix.tmy2.gz');
    expect(place.latitudeDeg).toBeCloseTo(33 + 26 / 60, 9);
    expect(place.longitudeDeg).toBeCloseTo(-(112 + 1 / 60), 9);
    expect([place.elevationM, place.utcOffsetH, station]).toEqual([339, -7, 'PHOENIX, AZ']);
    const guam = (await realRawYear('PI-Guam.tmy2.gz')).place;
    expect([guam.longitudeDeg > 0, guam.utcOffsetH]).toEqual([true, 10]);
  });

  test('St. Louis lies within 10 % of the published 30-year mean of GHI in every month', async () => {
    // Marion & Wilcox 1994, NREL/TP-463-5607, flat-plate at tilt 0, kWh/m2 a day, Jan..Dec; a typical year is one draw.
    const published = [2.2, 2.9, 3.9, 5.0, 5.9, 6.4, 6.4, 5.7, 4.6, 3.5, 2.3, 1.8];
    const days = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
    const got = monthlySums((await realYear('MO-St._louis.tmy2.gz')).ghi).map((wh, m) => wh / 1000 / days[m]);
    const ratios = got.map((v, m) => v / published[m]);
    console.log(
      `St. Louis GHI against the 30-year mean, by month: ${ratios.map((r) => r.toFixed(3)).join(' ')}`,
    );
    for (const r of ratios) expect(Math.abs(r - 1)).toBeLessThan(0.1);
  });
});
