export const amplitudeScales = ['linear', 'log', 'db'] as const;
export type AmplitudeScale = (typeof amplitudeScales)[number];
