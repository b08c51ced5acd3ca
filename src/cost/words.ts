/** A number for a sentence: `1 550`, `14.2`, `10`, `0.109`: three significant `digits` or all whole ones, thousands spaced. */
export const inWords = (x: number, digits = 3): string => {
  const size = Math.abs(x);
  const decimals = x === 0 ? 0 : Math.max(0, digits - 1 - Math.floor(Math.log10(size)));
  const [whole, part] = size.toFixed(Math.min(decimals, 6)).split('.');
  const spaced = whole.replace(/\B(?=(\d{3})+$)/g, ' ');
  const text = part === undefined || /^0+$/.test(part) ? spaced : `${spaced}.${part}`;
  return x < 0 && /[1-9]/.test(text) ? `-${text}` : text;
};
