/** Up to `decimals` decimals, without trailing zeros and without a negative zero. */
export const plain = (x: number, decimals = 2): string => String(Number(x.toFixed(decimals)) + 0);

/** `14 degrees`, `1 degree`. */
export const degreesText = (x: number, decimals = 1): string => {
  const number = plain(x, decimals);
  return `${number} ${number === '1' ? 'degree' : 'degrees'}`;
};
