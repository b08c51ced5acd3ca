import { expect, test } from 'vitest';
import { pointingWords } from '../../src/study/pointing-words.ts';

test('where a tracker points is told with the defaults that a study leaves unsaid', () => {
  const axis = { kind: 'single-axis', axisAzimuthDeg: 180, axisTiltDeg: 0, swingDeg: 60 } as const;
  expect(pointingWords({ ...axis, rows: null })).toBe(
    'turns about a level axis at azimuth 180°, swing 60° either way, true tracking',
  );
  expect(pointingWords({ ...axis, axisTiltDeg: 12.34, rows: { gcr: 0.4, lowSun: 'backtrack' } })).toBe(
    'turns about an axis falling 12.3° toward azimuth 180°, swing 60° either way, turning back from its neighbours when the sun is low',
  );
  expect(pointingWords({ kind: 'dual-axis', rows: null })).toBe('faces the sun');
  expect(pointingWords({ kind: 'roof-plane', tiltDeg: 14.04, azimuthDeg: 165.5 })).toBe(
    '14° tilt, facing 165.5° (south-south-east)',
  );
});
