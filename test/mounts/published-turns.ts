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
