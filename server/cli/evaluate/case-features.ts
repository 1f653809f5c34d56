import { extractFeatures } from '#shared/signal/analyse-waveform.ts';

/** The numbers behind a screening's score. */
export type FeatureValues = NonNullable<ReturnType<typeof extractFeatures>>;
