/**
 * Turn that faces the sun, GCR, cross-axis slope, backtracked turn; degrees. Level ground by Lorenzo, Narvarte & Munoz
 * 2011 (Prog. Photovolt. 19, 747), slopes by Anderson & Mikofski 2020 (NREL/TP-5K00-76626), worked out in another
 * program (Python).
 */
export const BACKTRACKED_TURNS = [
  [-74.7793, 0.4, 0, -25.8011],
  [-74.7793, 0.5, 0, -16.4527],
  [79.3724, 0.4, 0, 16.828],
  [79.3724, 0.5, 0, 11.0171],
  [70, 0.4, 0, 38.7653],
  [-80, 0.5, 0, -10.322],
  [75, 0.4, 5, 44.1281],
  [75, 0.4, -5, 10.8349],
];

/**
 * Turn, turn that faces the sun, GCR, cross-axis slope (degrees), shaded share of the row: Anderson & Mikofski 2020, eq. 32,
 * worked out in another program (Python) and checked there by a two-dimensional ray trace to 5e-5.
 */
export const SHADED_ROWS = [
  [60, 70, 0.4, 0, 0.13176],
  [60, 75, 0.4, 0, 0.33013],
  [45, 80, 0.5, 0, 0.57603],
  [-60, -75, 0.5, 0, 0.4641],
  [60, 70, 0.4, -5, 0.34046],
  [60, 70, 0.4, 5, 0],
  [-50, -72, 0.45, 5, 0.45879],
  [0, 80, 0.5, 0, 0],
];
