import {
  meetsTarget,
  type Figure,
  type MethodFigures,
  type ShareRow,
} from '#shared/signal/method-figures.ts';

/** The evaluation as a table for the terminal: each figure beside its target. */
export function printFigures(figures: MethodFigures): string {
  const lines = [
    `Method ${figures.methodVersion}, ${figures.evaluatedOn}: ${figures.waveforms} waveforms of ` +
      `${figures.machines} simulated machines (seed ${figures.seed}) that the fit has not seen`,
    '',
    ...figures.figures.map(figureLine),
    '',
    'Looseness found, by kind and severity',
    ...figures.recallByKind.map(shareLine),
    shareLine(figures.withoutSign),
    '',
    'Looseness found, by how many orders it raised',
    ...figures.recallBySigns.map(shareLine),
    '',
    'False alarms, by look-alike',
    ...figures.falseAlarms.map(shareLine),
    '',
    'Retakes asked for, by fault of the record',
    ...figures.retakesByFault.map(shareLine),
    '',
    'Calibration: score, and share of loose machines',
    ...figures.calibration.map(
      (bin) =>
        `  ${bin.from.toFixed(1)}–${bin.to.toFixed(1)}  ${bin.meanScore.toFixed(3)}  ` +
        `${bin.looseShare.toFixed(3)}  ${String(bin.cases).padStart(6)}`,
    ),
    '',
    'Scores of loose and other machines',
    ...figures.histogram.map(
      (bin) =>
        `  ${bin.from.toFixed(1)}–${bin.to.toFixed(1)}  ${String(bin.loose).padStart(6)}  ` +
        String(bin.notLoose).padStart(6),
    ),
  ];
  lines.push('', 'Limits of the score: looseness found, false alarms');
  for (const { limit, found, falseAlarms } of figures.operatingPoints) {
    const shares = [found, falseAlarms].map(({ hits, cases }) =>
      `${((100 * hits) / Math.max(1, cases)).toFixed(2)} %`.padStart(9),
    );
    lines.push(`  ${limit.toFixed(2)} ${shares.join(' ')}`);
  }
  if (figures.realRecordings.length > 0) {
    lines.push('', 'Real recordings flagged, by source');
    for (const { source, loose, flagged, retakes } of figures.realRecordings) {
      const name = `${loose ? 'loose' : 'not loose'}: ${source}`;
      lines.push(`${shareLine({ ...flagged, name })}, ${retakes} sent back`);
    }
  }
  return `${lines.join('\n')}\n`;
}

function figureLine(figure: Figure): string {
  const { name, value, unit, target, cases } = figure;
  const met = meetsTarget(figure);
  const mark = met === null ? '     ' : met ? 'met  ' : 'short';
  const shown = value === null ? 'not measured' : `${format(value)}${unit === '%' ? ' %' : ''}`;
  const wanted =
    target === null ? '' : `${target.bound} ${target.value}${unit === '%' ? ' %' : ''}`;
  return `  ${mark} ${shown.padStart(12)}  ${wanted.padEnd(16)} ${name} (${cases})`;
}

function shareLine({ name, cases, hits }: ShareRow): string {
  const share = cases === 0 ? '–' : `${((100 * hits) / cases).toFixed(1)} %`;
  return `  ${share.padStart(8)}  ${`${hits}/${cases}`.padStart(10)}  ${name}`;
}

const format = (value: number) =>
  Number.isInteger(value) ? String(value) : value.toPrecision(value >= 100 ? 4 : 3);
