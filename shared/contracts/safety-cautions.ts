/**
 * The cautions of the work itself, in the order they matter: shown before anything can be
 * reported, and sent with every inspection. Common practice of maintenance work.
 */
export const safetyCautions = [
  'Isolate the machine, lock it out and prove it dead before opening anything.',
  'Stored energy stays after isolation: springs, pressure, raised loads, windmilling fans.',
  'Surfaces may be hot: let the machine cool before touching or measuring it.',
  'Rotors, housings and bearings are heavy: lift with rated gear, never stand under a load.',
  'Heated bearings burn: wear gloves, keep hands clear, stay below the heating limit of the bearing.',
  'Never heat a bearing with an open flame.',
  "Fits and repairs follow the machine maker's drawing and the bearing supplier's guidance, which win over what is shown here.",
  'Local codes apply, and the judgement of licensed or certified people decides.',
] as const;
