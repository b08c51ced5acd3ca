import { InvalidArgumentError } from 'commander';

/** The strict parser of all numeric options: a plain decimal number within its range. */
export const numberBetween =
  (low: number, high: number, unit: string) =>
  (text: string): number => {
    const value = /^[+-]?(\d+\.?\d*|\.\d+)$/.test(text.trim()) ? Number(text) : Number.NaN;
    if (value >= low && value <= high) return value;
    throw new InvalidArgumentError(`Write a number from ${low} to ${high} (${unit}).`);
  };

export const folderName = (text: string): string => {
  if (text.trim() === '' || text.includes('\0'))
    throw new InvalidArgumentError('Write the name of a folder.');
  return text;
};
