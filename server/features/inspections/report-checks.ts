import type { FieldFault } from '#shared/contracts/error.ts';
import type { SeatName } from '#shared/contracts/fit-record.ts';
import type { InspectionReport, ReportedSeat, SeatReading } from '#shared/contracts/inspection.ts';
import { FitInputError } from '#shared/fits/fit-input-error.ts';
import { measuredDeviationUm } from '#shared/fits/measured-diameter.ts';

/** Nominal diameter of each seat, mm; null where the register doesn't know it. */
export type NominalMm = Readonly<Record<SeatName, number | null>>;

function readingFault(reading: SeatReading, nominalMm: number | null): string | null {
  if (nominalMm === null) return null;
  try {
    measuredDeviationUm(reading.diameterMm, nominalMm, 'diameterMm');
    return null;
  } catch (error) {
    if (error instanceof FitInputError) return error.message;
    throw error;
  }
}

/**
 * What is wrong with a report beyond its form: readings that can't be diameters of this seat, a
 * reading or a seat given twice. Each fault names its field.
 */
export function reportFaults(report: InspectionReport, nominalMm: NominalMm): FieldFault[] {
  const faults: FieldFault[] = [];
  const seatsSeen = new Set<string>();
  report.seats.forEach((seat, seatIndex) => {
    const path = `report.seats.${seatIndex}`;
    const key = `${seat.seat}/${seat.stage}`;
    if (seatsSeen.has(key)) {
      faults.push({ path, message: `The ${seat.seat} seat is reported twice ${seat.stage}.` });
    }
    seatsSeen.add(key);
    const placesSeen = new Set<string>();
    seat.readings.forEach((reading, index) => {
      const readingPath = `${path}.readings.${index}.diameterMm`;
      const place = `${reading.part}/${reading.plane}/${reading.directionDeg}`;
      if (placesSeen.has(place)) {
        faults.push({
          path: readingPath,
          message: `Plane ${reading.plane}, ${reading.directionDeg}° is given twice.`,
        });
      }
      placesSeen.add(place);
      const message = readingFault(reading, nominalMm[seat.seat]);
      if (message !== null) faults.push({ path: readingPath, message });
    });
  });
  return faults;
}

/** Mean diameter of one part over its planes and directions, to a tenth of a micrometre; null without readings. */
export function meanDiameterMm(seat: ReportedSeat, part: SeatReading['part']): number | null {
  const readings = seat.readings.filter((reading) => reading.part === part);
  if (readings.length === 0) return null;
  const sum = readings.reduce((total, reading) => total + reading.diameterMm, 0);
  return Math.round((sum / readings.length) * 1e4) / 1e4;
}
