import { boreLimitsUm, outsideLimitsUm } from './bearing-tolerances.ts';
import { fitCautions } from './fit-cautions.ts';
import type { PositionAssessment, PositionFit, SeatFit } from './fit-types.ts';
import { floatingTravelUm } from './floating-travel.ts';
import { limitDeviationsUm } from './limit-deviations.ts';
import { measuredDeviationUm } from './measured-diameter.ts';
import { mountingOf } from './mounting.ts';
import { neededInterferenceUm } from './needed-interference.ts';
import { positionClearance } from './position-clearance.ts';
import { racewayDiameters } from './raceway-diameters.ts';
import { recommendHousingClass } from './recommend-housing-class.ts';
import { recommendShaftClass } from './recommend-shaft-class.ts';
import type { Recommendation } from './recommendation.ts';
import { resolvePosition, type ResolvedPosition } from './resolve-position.ts';
import { ringGrowthUm } from './ring-growth.ts';
import { expansionUm } from './running-fit.ts';
import { seatFit } from './seat-fit.ts';
import { seatClassLimitsUm } from './seat-class-limits.ts';
import { taperedSeat } from './tapered-seat.ts';

function shaftRecommendation(position: ResolvedPosition): Recommendation | undefined {
  const { input, type, d } = position;
  if (d === undefined || type === undefined || input.innerLoad === undefined) return undefined;
  return recommendShaftClass({
    d,
    type,
    load: input.innerLoad,
    level: position.level,
    // A separable bearing takes up the travel between its rings; no ring needs to slide.
    mustSlide: (input.mustSlide ?? false) && !(position.bearing?.separable ?? false),
    shaftBoreMm: input.shaftBoreMm,
    clearanceAboveNormal: ['C3', 'C4', 'C5'].includes(position.clearanceGroup ?? ''),
  });
}

function housingRecommendation(position: ResolvedPosition): Recommendation | undefined {
  const { input, D } = position;
  if (D === undefined || input.outerLoad === undefined) return undefined;
  return recommendHousingClass({
    D,
    type: position.type ?? 'ball',
    load: input.outerLoad,
    level: position.level,
    mustSlide: (input.mustSlide ?? false) && !(position.bearing?.separable ?? false),
    split: input.splitHousing ?? false,
    heatThroughShaft: input.heatThroughShaft ?? false,
    thinHousing: input.thinHousing ?? false,
    lightAlloy: input.housingMaterial === 'aluminium',
    highAccuracy: input.highAccuracy ?? false,
    quietElectricMachine: input.quietElectricMachine ?? false,
  });
}

function growth(position: ResolvedPosition, d: number): number {
  const { type, D } = position;
  if (position.input.speedRpm === undefined || type === undefined || D === undefined) return 0;
  const raceway = racewayDiameters(type, d, D).innerMm;
  return ringGrowthUm(d, raceway, position.input.speedRpm, position.ring);
}

function shaftSeat(
  position: ResolvedPosition,
  recommendation?: Recommendation,
): SeatFit | undefined {
  const { input, d, B, temperaturesC: t } = position;
  if (d === undefined) return undefined;
  if (position.taperedBore) return taperedSeat(d, input.shaftTapered, input.shaftHistory);
  const fit = seatFit({
    seat: 'shaft',
    seatLimitsUm: seatClassLimitsUm('shaft', d, input.shaftClass),
    ringLimitsUm: boreLimitsUm(d, input.bearingClass ?? 'Normal'),
    seatMeasuredUm:
      input.shaftMeasuredMm === undefined
        ? undefined
        : measuredDeviationUm(input.shaftMeasuredMm, d, 'shaftMeasuredMm'),
    ringMeasuredUm:
      input.boreMeasuredMm === undefined
        ? undefined
        : measuredDeviationUm(input.boreMeasuredMm, d, 'boreMeasuredMm'),
    seatUncertaintyUm: input.uncertaintyUm?.shaft,
    ringUncertaintyUm: input.uncertaintyUm?.bore,
    recommendation,
    recommendedLimitsUm: recommendation && limitDeviationsUm(d, recommendation.toleranceClass),
    load: input.innerLoad,
    effects: {
      smoothingUm: input.smoothingUm ?? 0,
      expansionUm: expansionUm(
        d,
        { alphaPerK: position.shaft.alphaPerK, temperatureC: t.shaft },
        { alphaPerK: position.ring.alphaPerK, temperatureC: t.innerRing },
      ),
      ringGrowthUm: growth(position, d),
    },
    history: input.shaftHistory,
    bonded: input.shaftBonded ?? false,
  });
  if (input.radialLoadN === undefined || B === undefined || input.innerLoad === 'stationary') {
    return fit;
  }
  const needed = neededInterferenceUm({
    d,
    B,
    radialLoadN: input.radialLoadN,
    staticRatingN: input.staticRatingN,
    smoothingUm: input.smoothingUm,
    warmerThanSurroundingsK: input.warmerThanSurroundingsK,
  });
  return { ...fit, neededUm: needed };
}

function housingSeat(
  position: ResolvedPosition,
  recommendation?: Recommendation,
): SeatFit | undefined {
  const { input, D, temperaturesC: t } = position;
  if (D === undefined) return undefined;
  return seatFit({
    seat: 'housing',
    seatLimitsUm: seatClassLimitsUm('housing', D, input.housingClass),
    ringLimitsUm: outsideLimitsUm(D, input.bearingClass ?? 'Normal'),
    seatMeasuredUm:
      input.housingMeasuredMm === undefined
        ? undefined
        : measuredDeviationUm(input.housingMeasuredMm, D, 'housingMeasuredMm'),
    ringMeasuredUm:
      input.outsideMeasuredMm === undefined
        ? undefined
        : measuredDeviationUm(input.outsideMeasuredMm, D, 'outsideMeasuredMm'),
    seatUncertaintyUm: input.uncertaintyUm?.housing,
    ringUncertaintyUm: input.uncertaintyUm?.outside,
    recommendation,
    recommendedLimitsUm: recommendation && limitDeviationsUm(D, recommendation.toleranceClass),
    load: input.outerLoad,
    effects: {
      smoothingUm: input.smoothingUm ?? 0,
      expansionUm: expansionUm(
        D,
        { alphaPerK: position.ring.alphaPerK, temperatureC: t.outerRing },
        { alphaPerK: position.housing.alphaPerK, temperatureC: t.housing },
      ),
      ringGrowthUm: 0,
    },
    history: input.housingHistory,
    bonded: input.housingBonded ?? false,
  });
}

function travel(position: ResolvedPosition): number | undefined {
  const { input, temperaturesC: t } = position;
  const isWarm =
    input.temperaturesC?.shaft !== undefined || input.temperaturesC?.housing !== undefined;
  if (input.spanMm === undefined || !isWarm) return undefined;
  return floatingTravelUm(
    input.spanMm,
    { alphaPerK: position.shaft.alphaPerK, temperatureC: t.shaft },
    { alphaPerK: position.housing.alphaPerK, temperatureC: t.housing },
  );
}

/**
 * What is known of both seats of a bearing position and what it means: limits, fits at rest and
 * running, classes the load asks for, verdicts, internal clearance, mounting, floating travel and
 * cautions. Used by the command line and the server alike. Nothing is rounded; what can't be said is
 * absent. Interference positive, clearance negative, µm.
 *
 * @param input - see `PositionFit`; every field optional, a size is needed unless `plain`
 * @throws {FitInputError} with code and field for the first fault found
 */
export function assessSeats(input: PositionFit): PositionAssessment {
  if (input.plain) {
    return { cautions: ['A plain bearing has no rolling-bearing seats: no fits to assess here.'] };
  }
  const position = resolvePosition(input);
  const shaftAsk = position.taperedBore ? undefined : shaftRecommendation(position);
  const housingAsk = housingRecommendation(position);
  const shaft = shaftSeat(position, shaftAsk);
  const housing = housingSeat(position, housingAsk);
  const greatest = shaft?.interferenceUm?.max;
  const assessed = {
    shaftSeat: shaft,
    housingSeat: housing,
    internalClearanceUm: positionClearance(position, shaft, housing),
    mounting:
      position.d === undefined || greatest === undefined
        ? undefined
        : mountingOf({
            d: position.d,
            alphaPerK: position.ring.alphaPerK,
            greatestInterferenceUm: greatest,
            slideOnClearanceUm: input.slideOnClearanceUm,
            handlingMarginK: input.handlingMarginK,
            capped: position.capped,
          }),
    floatingTravelUm: travel(position),
  };
  return { ...assessed, cautions: fitCautions(position, assessed, [shaftAsk, housingAsk]) };
}
