import {
  planes,
  readingDirectionsDeg,
  type InspectionResponse,
} from '#shared/contracts/inspection.ts';
import type { SeatStage } from '#shared/contracts/fit-record.ts';
import { inPlaceCheckNames, inPlaceReadingUnits } from '#shared/contracts/in-place-check.ts';
import { safetyCautions } from '#shared/contracts/safety-cautions.ts';
import type { SeatAssessment } from '#shared/contracts/seat-assessment.ts';
import { seatMarks } from '#shared/fits/condition-words.ts';
import { measuringPlan } from '#shared/fits/measuring-plan.ts';
import { formatFixed } from '#shared/quantities/format-number.ts';
import { inspectionStateWords, limitsText, partWords, seatWords } from './paper-words.ts';
import { blank, titleBlock } from './sheet-blocks.ts';
import { contentWidth, ink, margin, type Sheet } from './sheet.ts';

export interface InspectionPaper {
  inspection: InspectionResponse;
  /** Of the bearing; null where the register does not tell it. */
  widthMm: number | null;
}

const tickIndent = 15;

/** A sheet to take along: what to check and within which limits, with blanks to fill by hand. */
export function drawInspection(sheet: Sheet, { inspection, widthMm }: InspectionPaper): void {
  titleBlock(
    sheet,
    `${inspection.machineTag} ${inspection.positionName}`,
    inspectionStateWords[inspection.state],
    [
      { label: 'Inspection', value: String(inspection.id) },
      { label: 'Machine', value: inspection.machineName },
      { label: 'Bearing position', value: inspection.positionCode },
      { label: 'Due', value: inspection.dueOn },
      { label: 'Asset owner', value: inspection.assigneeName },
      { label: 'Assigned by', value: inspection.assignedByName },
      { label: 'Work order', value: inspection.workOrderReference ?? 'none' },
      { label: 'Finding', value: String(inspection.findingId) },
    ],
  );
  sheet.paragraph(inspection.summary, { size: 9 });
  if (inspection.instructions !== null) {
    sheet.heading('Instructions');
    sheet.paragraph(inspection.instructions);
  }
  drawCautions(sheet);
  if (inspection.checkInPlace) drawInPlace(sheet);
  for (const seat of seatsToCheck(inspection)) drawSeat(sheet, seat, widthMm);
  drawWork(sheet, inspection);
}

const seatsToCheck = ({ seats, checkShaftSeat, checkHousingSeat }: InspectionResponse) =>
  seats.seats.filter(({ seat }) => (seat === 'shaft' ? checkShaftSeat : checkHousingSeat));

/** A line with a box before it. */
function tickLine(sheet: Sheet, text: string, left = margin, size = 8.5): void {
  const width = contentWidth - (left - margin) - tickIndent;
  sheet.ensure(sheet.heightOf(text, width, { size }) + 2);
  sheet.box(left, sheet.y + 1.5);
  sheet.y += sheet.textAt(text, left + tickIndent, sheet.y, width, { size }) + 2;
}

function drawCautions(sheet: Sheet): void {
  sheet.heading('Read and tick before anything is touched', 60);
  for (const caution of safetyCautions) tickLine(sheet, caution);
}

function drawInPlace(sheet: Sheet): void {
  sheet.heading('In place, before anything is opened', 60);
  sheet.paragraph('What is found here can spare the opening.', { color: ink.soft });
  sheet.y += 2;
  for (const name of inPlaceCheckNames) {
    sheet.ensure(20);
    const unit = inPlaceReadingUnits[name];
    sheet.textAt(name.charAt(0).toUpperCase() + name.slice(1), margin, sheet.y + 6, 120);
    ['sound', 'fault', 'not checked'].forEach((word, index) => {
      const x = margin + 122 + index * 52;
      sheet.box(x, sheet.y + 7);
      sheet.textAt(word, x + 11, sheet.y + 6, 50, { size: 7.5 });
    });
    const x = margin + 296;
    if (name === 'movement across the joint') {
      blank(sheet, `below, ${unit ?? ''}`, x, 54, 18);
      blank(sheet, `above, ${unit ?? ''}`, x + 60, 54, 18);
    } else if (unit !== null) {
      blank(sheet, `reading, ${unit}`, x, 114, 18);
    }
    blank(sheet, 'note', margin + 416, contentWidth - 416, 18);
    sheet.y += 21;
  }
}

function drawSeat(sheet: Sheet, seat: SeatAssessment, widthMm: number | null): void {
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
  else drawPlan(sheet, seat, widthMm);
  drawCondition(sheet);
}

function drawTapered(sheet: Sheet, taper: string): void {
  sheet.paragraph(
    `The seat is tapered (${taper}): it is judged by drive-up and loss of clearance, not by a diameter.`,
  );
  sheet.y += 3;
  sheet.ensure(30);
  const width = (contentWidth - 20) / 3;
  ['drive-up, mm', 'clearance before, µm', 'clearance after, µm'].forEach((label, index) =>
    blank(sheet, label, margin + index * (width + 10), width),
  );
  sheet.y += 30;
}

function drawPlan(sheet: Sheet, seat: SeatAssessment, widthMm: number | null): void {
  if (seat.nominalMm !== null) {
    const plan = measuringPlan(seat.seat, seat.nominalMm, widthMm ?? undefined);
    sheet.paragraph(plan.instrument);
    if (plan.planesMm !== undefined) {
      const [near, far] = plan.planesMm.map((mm) => formatFixed(mm, 1));
      sheet.paragraph(`Planes ${near} mm and ${far} mm from the open end of the seat.`);
    }
    for (const step of plan.steps) sheet.paragraph(`· ${step}`, { size: 8, indent: 6 });
  }
  for (const stage of ['as found', 'as left'] as const) drawReadings(sheet, seat.seat, stage);
}

const labelWidth = 44;
const rowHeight = 18;
const sideGap = 12;

/** The seat on the left, the ring on the right: two planes, four directions, a blank for each. */
function drawReadings(sheet: Sheet, seat: SeatAssessment['seat'], stage: SeatStage): void {
  sheet.ensure(28 + 2 * rowHeight);
  sheet.y += 5;
  const width = (contentWidth - sideGap) / 2;
  const top = sheet.y;
  for (const [index, part] of (['seat', 'ring'] as const).entries()) {
    sheet.y = top;
    const left = margin + index * (width + sideGap);
    readingGrid(sheet, `${partWords[seat][part]} ${stage}, mm / inch`, left, width);
  }
}

function readingGrid(sheet: Sheet, title: string, left: number, width: number): void {
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
    for (const index of readingDirectionsDeg.keys()) {
      sheet.doc
        .rect(xOf(index), sheet.y, column, rowHeight)
        .lineWidth(0.6)
        .strokeColor(ink.full)
        .stroke();
    }
    sheet.y += rowHeight;
  }
}

function drawCondition(sheet: Sheet): void {
  sheet.ensure(62);
  sheet.y += 6;
  sheet.textAt('Condition as found', margin, sheet.y, contentWidth, { face: 'strong', size: 8 });
  sheet.y += 12;
  const columns = 4;
  const width = contentWidth / columns;
  seatMarks.forEach((mark, index) => {
    const x = margin + (index % columns) * width;
    const y = sheet.y + Math.floor(index / columns) * 13;
    sheet.box(x, y + 1);
    sheet.textAt(mark, x + 12, y, width - 14, { size: 8 });
  });
  sheet.y += Math.ceil(seatMarks.length / columns) * 13 + 2;
  const third = (contentWidth - 20) / 3;
  [
    'temperature of the part, °C',
    'instrument and its number',
    'gauge checked before and after',
  ].forEach((label, index) => blank(sheet, label, margin + index * (third + 10), third));
  sheet.y += 28;
}

function drawWork(sheet: Sheet, { seats }: InspectionResponse): void {
  const advice = seats.mounting?.advice ?? '';
  sheet.heading('Work done', 150 + (advice === '' ? 0 : sheet.heightOf(advice, contentWidth)));
  if (advice !== '') sheet.paragraph(advice, { color: ink.soft });
  sheet.y += 4;
  ['What was done, parts used', '', '', ''].forEach((label) => {
    blank(sheet, label, margin, contentWidth, 20);
    sheet.y += 20;
  });
  sheet.y += 8;
  ['Looseness was found', 'No looseness was found', 'Not clear', 'The fit was put right'].forEach(
    (word, index) => {
      const x = margin + index * (contentWidth / 4);
      sheet.box(x, sheet.y + 1);
      sheet.textAt(word, x + 12, sheet.y, contentWidth / 4 - 14, { size: 8 });
    },
  );
  sheet.y += 18;
  const third = (contentWidth - 20) / 3;
  ['name', 'date', 'signature'].forEach((label, index) =>
    blank(sheet, label, margin + index * (third + 10), third, 30),
  );
  sheet.y += 32;
  if (seats.cautions.length === 0) return;
  sheet.heading('About these figures');
  for (const note of seats.cautions) sheet.paragraph(note, { size: 7.5, color: ink.soft });
}
