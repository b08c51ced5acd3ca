/**
 * Writes orlin.epw, the invented hourly year of Orlin Bench, beside this file:
 *
 *     npx tsx sample-data/make-sample.ts
 *
 * The same seed gives the same bytes: no clock, no network, no other input. README.md beside this file tells what the
 * model is; maker/sample-year.ts is where it comes together.
 */
import { writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { epwText } from './maker/epw.ts';
import { makeSampleYear, SEED } from './maker/sample-year.ts';

const path = fileURLToPath(new URL('orlin.epw', import.meta.url));
const text = epwText(makeSampleYear(SEED));
writeFileSync(path, text);
console.log(`wrote ${path}: seed ${SEED}, ${text.length} bytes`);
