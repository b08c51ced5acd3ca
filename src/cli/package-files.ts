import { existsSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The package's own folder, whether this runs from its sources, its bundle or an installed copy: the nearest above with a package.json. */
export const packageRoot = (): string => {
  let folder = dirname(fileURLToPath(import.meta.url));
  while (!existsSync(join(folder, 'package.json'))) {
    const above = dirname(folder);
    if (above === folder) throw new Error('trackworth does not find its own package.json');
    folder = above;
  }
  return folder;
};

export const version = (): string =>
  (JSON.parse(readFileSync(join(packageRoot(), 'package.json'), 'utf8')) as { version: string }).version;

export const SAMPLE_STUDY = 'orlin.yaml';
export const SAMPLE_WEATHER = 'orlin.epw';
export const samplePath = (name: string): string => join(packageRoot(), 'sample-data', name);

/** The face that charts are measured in. */
export const fontFiles = (): { regular: Uint8Array; bold: Uint8Array } => {
  const { resolve } = createRequire(import.meta.url);
  const weight = (name: string) =>
    readFileSync(resolve(`@expo-google-fonts/inter/${name}/Inter_${name}.ttf`));
  return { regular: weight('400Regular'), bold: weight('700Bold') };
};
