const LONGEST = 60;

/**
 * The name of a report's folder: the title in lower case, its letters and digits of any script joined by `-`, and
 * `-report`. The ending also keeps clear of names that Windows reserves, such as CON.
 */
export const reportFolderName = (title: string): string => {
  const words = title
    .normalize('NFC')
    .toLowerCase()
    .split(/[^\p{L}\p{M}\p{N}]+/u)
    .filter((word) => word !== '');
  // Cut by code point, never inside a letter of two UTF-16 units.
  const stem = [...words.join('-')].slice(0, LONGEST).join('').replace(/-+$/, '');
  return `${stem === '' ? 'study' : stem}-report`;
};
