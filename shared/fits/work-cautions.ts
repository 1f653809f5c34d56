/**
 * What must be read before a seat is opened, measured or a bearing is mounted. Common practice of
 * plant safety, no source; local codes and the maker's instructions go further.
 */
export const workCautions: readonly string[] = [
  'Isolate, lock out and prove dead before opening; release stored energy: springs, pressure, raised or turning parts.',
  'Surfaces may be hot; parts are heavy: use rated lifting gear and stay clear of the load.',
  'Heated bearings burn: gloves, clear hands, a place to put the bearing down. Never heat with an open flame.',
  'Stay below the heating limit of the bearing: 120 °C for open ones, 80 °C for sealed or greased ones, unless its maker says less.',
  "Fits and repairs follow the machine maker's drawing, the bearing supplier's guidance, local codes and the judgement of licensed or certified people.",
  'A screening is a hint for a qualified analyst, not a diagnosis and not a release to run.',
];
