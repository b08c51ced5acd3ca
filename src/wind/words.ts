/** Stands in every output that shows a wind figure. */
export const DEFERRAL =
  'Wind figures are screening only, not a structural design: design wind, pressures, attachments and foundations ' +
  'belong to the locally adopted code and a licensed engineer.';

export const GUST_NOTE =
  'The design gust comes from the code map; it is not the hourly mean wind of the weather file, which only cools ' +
  'the modules here.';
