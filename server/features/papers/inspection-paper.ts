import type { InspectionReport, InspectionResponse } from '#shared/contracts/inspection.ts';
import {
  inPlaceCheckNames,
  inPlaceFindings,
  inPlaceReadingUnits,
} from '#shared/contracts/in-place-check.ts';
import { safetyCautions } from '#shared/contracts/safety-cautions.ts';
import { formatSignificant } from '#shared/quantities/format-number.ts';
import { drawSeat } from './inspection-seat.ts';
import { inspectionStateWords } from './paper-words.ts';
import { blank, titleBlock } from './sheet-blocks.ts';
import { contentWidth, ink, margin, type Sheet } from './sheet.ts';

export interface InspectionPaper {
  inspection: InspectionResponse;
  /** Of the bearing; null where the register does not tell it. */
  widthMm: number | null;
}

const tickIndent = 15;

/**
 * A sheet to take along: what to check and within which limits, with blanks to fill by hand. Once
 * the inspection is reported the same sheet holds what was reported.
 */
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
  const { report } = inspection;
  drawCautions(sheet, report);
  if (inspection.checkInPlace) drawInPlace(sheet, report);
  for (const seat of seatsToCheck(inspection)) drawSeat(sheet, { seat, widthMm, report });
  drawWork(sheet, inspection);
}

const seatsToCheck = ({ seats, checkShaftSeat, checkHousingSeat }: InspectionResponse) =>
  seats.seats.filter(({ seat }) => (seat === 'shaft' ? checkShaftSeat : checkHousingSeat));

type Report = InspectionReport | null;

/** A line with a box before it. */
function tickLine(sheet: Sheet, text: string, ticked: boolean): void {
  const width = contentWidth - tickIndent;
  sheet.ensure(sheet.heightOf(text, width) + 2);
  sheet.box(margin, sheet.y + 1.5, ticked);
  sheet.y += sheet.textAt(text, margin + tickIndent, sheet.y, width) + 2;
}

function drawCautions(sheet: Sheet, report: Report): void {
  sheet.heading('Read and tick before anything is touched', 60);
  for (const caution of safetyCautions) tickLine(sheet, caution, report !== null);
}

function drawInPlace(sheet: Sheet, report: Report): void {
  sheet.heading('In place, before anything is opened', 60);
  sheet.paragraph('What is found here can spare the opening.', { color: ink.soft });
  sheet.y += 2;
  for (const name of inPlaceCheckNames) {
    sheet.ensure(20);
    const unit = inPlaceReadingUnits[name];
    const told = report?.inPlaceChecks.find(({ check }) => check === name);
    const reading = numberText(told?.reading);
    sheet.textAt(name.charAt(0).toUpperCase() + name.slice(1), margin, sheet.y + 6, 120);
    inPlaceFindings.forEach((word, index) => {
      const x = margin + 122 + index * 52;
      sheet.box(x, sheet.y + 7, told?.finding === word);
      sheet.textAt(word, x + 11, sheet.y + 6, 50, { size: 7.5 });
    });
    const x = margin + 296;
    if (name === 'movement across the joint') {
      blank(sheet, `below, ${unit ?? ''}`, { x, width: 54, height: 18 }, reading);
      const above = numberText(told?.readingAbove);
      blank(sheet, `above, ${unit ?? ''}`, { x: x + 60, width: 54, height: 18 }, above);
    } else if (unit !== null) {
      blank(sheet, `reading, ${unit}`, { x, width: 114, height: 18 }, reading);
    }
    const noteWidth = contentWidth - 416;
    blank(sheet, 'note', { x: margin + 416, width: noteWidth, height: 18 }, told?.note ?? null);
    sheet.y += 21;
  }
  if (report?.inPlaceResult) sheet.paragraph(`Found in place: ${report.inPlaceResult}`);
  if (report?.causeInPlace) {
    sheet.paragraph('The cause was found in place: the seats stayed closed.', { face: 'strong' });
  }
}

const numberText = (value: number | null | undefined): string | null =>
  value == null ? null : formatSignificant(value, 4);

function drawWork(sheet: Sheet, inspection: InspectionResponse): void {
  const { seats, report, reportedAt } = inspection;
  const advice = seats.mounting?.advice ?? '';
  sheet.heading(
    'Work done',
    (report === null ? 150 : 90) + (advice === '' ? 0 : sheet.heightOf(advice, contentWidth)),
  );
  if (advice !== '') sheet.paragraph(advice, { color: ink.soft });
  sheet.y += 4;
  if (report !== null) sheet.paragraph(report.workDone);
  else {
    for (const label of ['What was done, parts used', '', '', '']) {
      blank(sheet, label, { x: margin, width: contentWidth, height: 20 });
      sheet.y += 20;
    }
  }
  sheet.y += 8;
  sheet.ensure(52);
  const results = [
    { word: 'Looseness was found', ticked: report?.outcome === 'loose' },
    { word: 'No looseness was found', ticked: report?.outcome === 'not loose' },
    { word: 'Not clear', ticked: report?.outcome === 'not clear' },
    { word: 'The fit was put right', ticked: report?.repaired === true },
  ];
  for (const [index, { word, ticked }] of results.entries()) {
    const x = margin + index * (contentWidth / results.length);
    sheet.box(x, sheet.y + 1, ticked);
    sheet.textAt(word, x + 12, sheet.y, contentWidth / results.length - 14, { size: 8 });
  }
  sheet.y += 18;
  const third = (contentWidth - 20) / 3;
  const signed = [
    { label: 'name', filled: report === null ? null : inspection.assigneeName },
    { label: 'date', filled: reportedAt?.slice(0, 10) ?? null },
    { label: 'signature', filled: null },
  ];
  for (const [index, { label, filled }] of signed.entries()) {
    blank(sheet, label, { x: margin + index * (third + 10), width: third, height: 30 }, filled);
  }
  sheet.y += 32;
  if (seats.cautions.length === 0) return;
  sheet.heading('About these figures');
  for (const note of seats.cautions) sheet.paragraph(note, { size: 7.5, color: ink.soft });
}
