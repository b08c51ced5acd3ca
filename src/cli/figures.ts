/** Up to `decimals` decimals, without trailing zeros and without a negative zero. */
export const trimmed = (x: number, decimals = 2): string => String(Number(x.toFixed(decimals)) + 0);

const side = (deg: number, plus: string, minus: string): string =>
  `${Math.abs(deg).toFixed(2)} ${deg < 0 ? minus : plus}`;

/** `40.10 N 104.92 W`. */
export const placeWords = (latitudeDeg: number, longitudeDeg: number): string =>
  `${side(latitudeDeg, 'N', 'S')} ${side(longitudeDeg, 'E', 'W')}`;
