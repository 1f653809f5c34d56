import {
  seatStages,
  type SeatCondition,
  type SeatName,
  type SeatStage,
} from '#shared/contracts/fit-record.ts';
import {
  planes,
  readingDirectionsDeg,
  type InspectionReport,
  type SeatReading,
} from '#shared/contracts/inspection.ts';
import type { SeatAssessment } from '#shared/contracts/seat-assessment.ts';
import { seatMarks } from '#shared/fits/condition-words.ts';
import { measuringPlan } from '#shared/fits/measuring-plan.ts';
import { formatFixed } from '#shared/quantities/format-number.ts';
import { limitsText, partWords, seatWords } from './paper-words.ts';
import { blank } from './sheet-blocks.ts';
import { contentWidth, ink, margin, type Sheet } from './sheet.ts';

export interface CheckedSeat {
  seat: SeatAssessment;
  widthMm: number | null;
  report: InspectionReport | null;
}

const reportedOf = (report: InspectionReport | null, seat: SeatName, stage: SeatStage) =>
  report?.seats.find(
    // Reports of old have no stage: they told of the seat as found.
    (one) => one.seat === seat && (one.stage ?? 'as found') === stage,
  );

/** One seat: its limits, how to measure it, and the blanks for readings and condition. */
export function drawSeat(sheet: Sheet, checked: CheckedSeat): void {
  const { seat, report } = checked;
  const toleranceClass = seat.toleranceClass === null ? '' : `, class ${seat.toleranceClass}`;
  sheet.heading(`${seatWords[seat.seat]}${toleranceClass}`, 120);
  const limits = limitsText(seat);
  sheet.paragraph(
    limits === null
      ? `${partWords[seat.seat].seat}: no limits on record. Measure it, that is the first step.`
      : `${partWords[seat.seat].seat}: ${limits}.`,
    { face: 'strong', size: 9 },
  );
  if (seat.recommendedClass !== null && seat.recommendedClass !== seat.toleranceClass) {
    sheet.paragraph(
      `Common practice for this load asks for ${seat.recommendedClass}; the machine maker’s drawing wins.`,
      { color: ink.soft },
    );
  }
  sheet.paragraph(seat.sentence, { color: ink.soft });
  if (seat.taper !== null) drawTapered(sheet, seat.taper);
  else drawPlan(sheet, checked);
  drawCondition(sheet, reportedOf(report, seat.seat, 'as found')?.condition ?? null);
}

function drawTapered(sheet: Sheet, taper: string): void {
  sheet.paragraph(
    `The seat is tapered (${taper}): it is judged by drive-up and loss of clearance, not by a diameter.`,
  );
  sheet.y += 3;
  sheet.ensure(30);
  const width = (contentWidth - 20) / 3;
  ['drive-up, mm', 'clearance before, µm', 'clearance after, µm'].forEach((label, index) =>
    blank(sheet, label, { x: margin + index * (width + 10), width }),
  );
  sheet.y += 30;
}

function drawPlan(sheet: Sheet, { seat, widthMm, report }: CheckedSeat): void {
  if (seat.nominalMm !== null) {
    const plan = measuringPlan(seat.seat, seat.nominalMm, widthMm ?? undefined);
    sheet.paragraph(plan.instrument);
    if (plan.planesMm !== undefined) {
      const [near, far] = plan.planesMm.map((mm) => formatFixed(mm, 1));
      sheet.paragraph(`Planes ${near} mm and ${far} mm from the open end of the seat.`);
    }
    for (const step of plan.steps) sheet.paragraph(`· ${step}`, { size: 8, indent: 6 });
  }
  for (const stage of seatStages) drawReadings(sheet, seat.seat, stage, report);
}

const labelWidth = 44;
const rowHeight = 18;
const sideGap = 12;

/** The seat on the left, the ring on the right: two planes, four directions, a blank for each. */
function drawReadings(
  sheet: Sheet,
  seat: SeatName,
  stage: SeatStage,
  report: InspectionReport | null,
): void {
  sheet.ensure(28 + 2 * rowHeight);
  sheet.y += 5;
  const width = (contentWidth - sideGap) / 2;
  const top = sheet.y;
  for (const [index, part] of (['seat', 'ring'] as const).entries()) {
    sheet.y = top;
    const left = margin + index * (width + sideGap);
    // Readings are kept in millimetres, whatever they were read in.
    const title = `${partWords[seat][part]} ${stage}, ${report === null ? 'mm / inch' : 'mm'}`;
    const readings = reportedOf(report, seat, stage)?.readings ?? [];
    const ofPart = readings.filter((reading) => reading.part === part);
    readingGrid(sheet, title, { left, width }, ofPart);
  }
}

function readingGrid(
  sheet: Sheet,
  title: string,
  { left, width }: { left: number; width: number },
  readings: readonly SeatReading[],
): void {
  const column = (width - labelWidth) / readingDirectionsDeg.length;
  const xOf = (index: number) => left + labelWidth + index * column;
  sheet.textAt(title, left, sheet.y, width, { face: 'strong', size: 8, maxLines: 1 });
  sheet.y += 12;
  for (const [index, direction] of readingDirectionsDeg.entries()) {
    sheet.textAt(`${direction}°`, xOf(index), sheet.y, column, {
      size: 7,
      color: ink.soft,
      align: 'center',
    });
  }
  sheet.y += 10;
  for (const plane of planes) {
    const label = plane === 1 ? 'Plane 1, at the shoulder' : 'Plane 2, open end';
    sheet.textAt(label, left, sheet.y + 1, labelWidth - 3, { size: 6.5, color: ink.soft });
    for (const [index, direction] of readingDirectionsDeg.entries()) {
      const read = readings.find((one) => one.plane === plane && one.directionDeg === direction);
      sheet.doc
        .rect(xOf(index), sheet.y, column, rowHeight)
        .lineWidth(0.6)
        .strokeColor(ink.full)
        .stroke();
      if (read === undefined) continue;
      const text = formatFixed(read.diameterMm, 4);
      const style = { face: 'figures', size: 7.5, align: 'center' } as const;
      sheet.textAt(text, xOf(index), sheet.y + 4, column, style);
    }
    sheet.y += rowHeight;
  }
}

function drawCondition(sheet: Sheet, condition: SeatCondition | null): void {
  sheet.ensure(62);
  sheet.y += 6;
  sheet.textAt('Condition as found', margin, sheet.y, contentWidth, { face: 'strong', size: 8 });
  sheet.y += 12;
  const columns = 4;
  const width = contentWidth / columns;
  seatMarks.forEach((mark, index) => {
    const x = margin + (index % columns) * width;
    const y = sheet.y + Math.floor(index / columns) * 13;
    sheet.box(x, y + 1, condition === mark);
    sheet.textAt(mark, x + 12, y, width - 14, { size: 8 });
  });
  sheet.y += Math.ceil(seatMarks.length / columns) * 13 + 2;
  const third = (contentWidth - 20) / 3;
  [
    'temperature of the part, °C',
    'instrument and its number',
    'gauge checked before and after',
  ].forEach((label, index) =>
    blank(sheet, label, { x: margin + index * (third + 10), width: third }),
  );
  sheet.y += 28;
}
