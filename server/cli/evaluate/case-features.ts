import type { ScreeningFeatures } from '#shared/signal/features.ts';

/** The numbers behind a screening's score. */
export type FeatureValues = ScreeningFeatures;
