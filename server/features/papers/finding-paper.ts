import type { FindingResponse, StateChangeResponse } from '#shared/contracts/finding.ts';
import type { SeatAssessment } from '#shared/contracts/seat-assessment.ts';
import type { ScreeningResponse } from '#shared/contracts/screening.ts';
import { formatFixed } from '#shared/quantities/format-number.ts';
import { drawFit, fitDrawingHeight } from './fit-drawing.ts';
import {
  dayOf,
  findingStateWords,
  fitWord,
  inspectionStateWords,
  limitsText,
  percentText,
  scoreText,
  seatWords,
  stateWord,
  verdictWords,
} from './paper-words.ts';
import { listWithin, titleBlock } from './sheet-blocks.ts';
import { contentWidth, ink, margin, type Sheet } from './sheet.ts';
import { drawSpectrum, type SpectrumData } from './spectrum-drawing.ts';
import { drawTime, type TimeData } from './time-drawing.ts';

/** The clearest screening of the finding with its plots, as far as they are kept. */
export interface ShownScreening {
  screening: ScreeningResponse;
  pointLabel: string;
  surveyedOn: string;
  spectrum: SpectrumData | null;
  times: readonly TimeData[];
}

export interface FindingPaper {
  finding: FindingResponse;
  shown: ShownScreening | null;
}

const gap = 14;
const half = (contentWidth - gap) / 2;
const rightX = margin + half + gap;
const small = { size: 7.5 } as const;

/** One page: what was seen, what speaks for and against, which seat, and what was decided. */
export function drawFinding(sheet: Sheet, { finding, shown }: FindingPaper): void {
  titleBlock(
    sheet,
    `${finding.machineTag} ${finding.positionName}`,
    findingStateWords[finding.state],
    [
      { label: 'Finding', value: String(finding.id) },
      { label: 'Machine', value: finding.machineName },
      { label: 'Bearing position', value: finding.positionCode },
      { label: 'Asset owner', value: finding.ownerName ?? 'nobody' },
      { label: 'Opened', value: dayOf(finding.openedAt) },
      {
        label: 'Clearest sign',
        value: `${verdictWords[finding.verdict]}, ${scoreText(finding.score)}`,
      },
      { label: 'Screenings that show it', value: String(finding.screenings.length) },
      { label: 'Work orders', value: workOrdersOf(finding) },
    ],
  );
  drawPlots(sheet, shown);
  drawEvidence(sheet, shown);
  drawSeats(sheet, finding);
  drawDecisions(sheet, finding);
}

const workOrdersOf = ({ inspections }: FindingResponse): string =>
  [...new Set(inspections.flatMap((one) => one.workOrderReference ?? []))].join(', ') || 'none';

function drawPlots(sheet: Sheet, shown: ShownScreening | null): void {
  if (shown === null) {
    sheet.paragraph('No screening is kept with this finding.', { color: ink.faint });
    return;
  }
  const { result } = shown.screening;
  const speed =
    result.speed.speedHz === null
      ? 'speed not found'
      : `${formatFixed(result.speed.speedHz * 60, 0)} r/min`;
  const overall =
    result.overallVelocity === null
      ? ''
      : `, overall ${formatFixed(result.overallVelocity.mmPerSRms, 2)} mm/s rms`;
  sheet.paragraph(
    `${shown.pointLabel}, survey of ${shown.surveyedOn}: ${verdictWords[result.verdict]}, ${scoreText(result.score)}; ${speed}${overall}; method ${result.methodVersion}, limits ${formatFixed(result.limits.suspectedScore, 2)} and ${formatFixed(result.limits.likelyScore, 2)}.`,
    { face: 'strong', size: 8 },
  );
  sheet.y += 3;
  if (shown.spectrum === null) {
    sheet.paragraph('The spectrum of this screening is not kept.', { color: ink.faint });
  } else {
    drawSpectrum(sheet, shown.spectrum);
  }
  const [first, second] = shown.times;
  if (first === undefined) return;
  const width = second === undefined ? contentWidth : half;
  const height = drawTime(sheet, first, margin, width);
  if (second !== undefined) drawTime(sheet, second, rightX, half);
  sheet.y += height;
}

function drawEvidence(sheet: Sheet, shown: ShownScreening | null): void {
  if (shown === null) return;
  const { evidence, lookAlikes, quality } = shown.screening.result;
  const speaksFor = evidence.filter((one) => one.for).map(({ text }) => text);
  const speaksAgainst = [
    ...evidence.filter((one) => !one.for).map(({ text }) => text),
    ...lookAlikes
      .filter(({ ruledOut }) => !ruledOut)
      .map(({ name, reason }) => `Could look alike: ${name}. ${reason}`),
    ...quality.map(({ message }) => message),
  ];
  sheet.rule(sheet.y, ink.hairline);
  sheet.y += 3;
  const y = sheet.y + 12;
  const height = 128;
  const heads = [
    { text: 'Speaks for looseness', x: margin, items: speaksFor },
    { text: 'Speaks against it, or could look alike', x: rightX, items: speaksAgainst },
  ];
  const used = heads.map(({ text, x, items }) => {
    sheet.textAt(text, x, sheet.y, half, { face: 'strong' });
    const shownItems = items.length === 0 ? ['Nothing.'] : items;
    return listWithin(sheet, shownItems, { x, y, width: half, height }, small);
  });
  sheet.y = y + Math.max(...used) + 3;
}

function seatLines(seat: SeatAssessment): string[] {
  const limits = limitsText(seat);
  const lines = [
    limits === null ? 'No limits on record.' : `Limits ${limits}.`,
    ...(seat.measuredUm === null ? [] : [`Measured ${fitWord(seat.measuredUm.value)}.`]),
    ...(seat.interferenceUm === null || seat.interferenceUm.min === seat.interferenceUm.max
      ? []
      : [`By record ${fitWord(seat.interferenceUm.min)} to ${fitWord(seat.interferenceUm.max)}.`]),
    ...(seat.chanceOfClearance === null
      ? []
      : [`Chance that it runs with clearance: ${percentText(seat.chanceOfClearance)}.`]),
  ];
  return [lines.join(' '), seat.sentence];
}

const headOf = (seat: SeatAssessment): string => {
  const toleranceClass = seat.toleranceClass === null ? '' : ` ${seat.toleranceClass}`;
  const rank =
    seat.suspicionRank === null
      ? ''
      : `, suspicion ${seat.suspicionRank}${seat.suspicion === null ? '' : ` (${percentText(seat.suspicion)})`}`;
  return `${seatWords[seat.seat]}${toleranceClass}${rank}`;
};

function drawSeats(sheet: Sheet, { seats }: FindingResponse): void {
  sheet.rule(sheet.y, ink.hairline);
  sheet.y += 3;
  sheet.y +=
    sheet.textAt(`Which seat can explain it: ${seats.conclusion}`, margin, sheet.y, contentWidth, {
      face: 'strong',
      maxLines: 3,
    }) + 3;
  if (seats.seats.length === 0) return;
  const top = sheet.y;
  const gaugeWidth = 108;
  const used = seats.seats.slice(0, 2).map((seat, index) => {
    const x = index === 0 ? margin : rightX;
    sheet.y = top;
    const headHeight = sheet.textAt(headOf(seat), x, top, half, {
      face: 'strong',
      color: ink.fit,
      size: 8,
      maxLines: 1,
    });
    sheet.y = top + headHeight;
    drawFit(sheet, seat, x, gaugeWidth);
    const height = listWithin(
      sheet,
      seatLines(seat),
      { x: x + gaugeWidth + 6, y: top + headHeight, width: half - gaugeWidth - 6, height: 104 },
      { size: 7 },
    );
    return headHeight + Math.max(fitDrawingHeight, height);
  });
  sheet.y = top + Math.max(...used) + 4;
}

const changeText = (change: StateChangeResponse): string => {
  const what = change.subject === 'finding' ? '' : 'Inspection ';
  const reason = change.reason === null || change.reason === '' ? '' : `: ${change.reason}`;
  return `${dayOf(change.changedAt)} ${what}${stateWord(change.toState)}, ${change.changedByName}${reason}`;
};

function drawDecisions(sheet: Sheet, finding: FindingResponse): void {
  sheet.rule(sheet.y, ink.hairline);
  sheet.y += 3;
  sheet.textAt('Decisions, newest first', margin, sheet.y, contentWidth, { face: 'strong' });
  const y = sheet.y + 12;
  const comparison = finding.verification?.comparison;
  const lines = [
    ...(comparison == null ? [] : [comparison.sentence]),
    ...finding.inspections
      .slice(0, 1)
      .map(
        (one) =>
          `Inspection ${one.id}: ${inspectionStateWords[one.state]}, ${one.assigneeName}, due ${one.dueOn}${one.workOrderReference === null ? '' : `, work order ${one.workOrderReference}`}.`,
      ),
    ...[...finding.history].reverse().map(changeText),
  ].map((line) =>
    sheet.lines(line.replace(/\s+/g, ' '), contentWidth - 9, { ...small, maxLines: 2 }).join(' '),
  );
  listWithin(sheet, lines, { x: margin, y, width: contentWidth, height: sheet.left - 12 }, small);
}
