import { existsSync, mkdirSync, rmdirSync } from 'node:fs';
import { dirname } from 'node:path';

/**
 * Makes a folder and those above it that are lacking, and adds each that it made to `made`, outermost first. (The
 * system's own recursive call never ends where a disk such as /proc says that the new folder's parent does not exist.)
 */
export const makeFolders = (path: string, made: string[]): void => {
  if (existsSync(path)) return;
  makeFolders(dirname(path), made);
  mkdirSync(path);
  made.push(path);
};

/** Takes back the folders that `makeFolders` made, where what they were made for could not be written. */
export const unmakeFolders = (made: readonly string[]): void => {
  for (const folder of made.toReversed()) rmdirSync(folder);
};
