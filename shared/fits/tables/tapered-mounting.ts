/**
 * Mounting spherical roller bearings on a tapered seat or sleeve: reduction of the radial internal
 * clearance, µm, and axial drive-up, mm, as [least, greatest]. One source, a bearing maker's
 * published mounting card; makers differ by a few micrometres, the machine maker's figure wins.
 */
export interface TaperedMountingRow {
  above: number;
  upTo: number;
  reductionUm: readonly [number, number];
  driveUpMm: Readonly<Partial<Record<'1:12' | '1:30', readonly [number, number]>>>;
}

export const taperedMounting: readonly TaperedMountingRow[] = [
  { above: 24, upTo: 30, reductionUm: [10, 15], driveUpMm: { '1:12': [0.25, 0.29] } },
  { above: 30, upTo: 40, reductionUm: [15, 20], driveUpMm: { '1:12': [0.3, 0.35] } },
  { above: 40, upTo: 50, reductionUm: [20, 25], driveUpMm: { '1:12': [0.37, 0.44] } },
  {
    above: 50,
    upTo: 65,
    reductionUm: [25, 35],
    driveUpMm: { '1:12': [0.45, 0.54], '1:30': [1.15, 1.35] },
  },
  {
    above: 65,
    upTo: 80,
    reductionUm: [35, 40],
    driveUpMm: { '1:12': [0.55, 0.65], '1:30': [1.4, 1.65] },
  },
  {
    above: 80,
    upTo: 100,
    reductionUm: [40, 50],
    driveUpMm: { '1:12': [0.66, 0.79], '1:30': [1.65, 2.0] },
  },
  {
    above: 100,
    upTo: 120,
    reductionUm: [50, 60],
    driveUpMm: { '1:12': [0.79, 0.95], '1:30': [2.0, 2.35] },
  },
  {
    above: 120,
    upTo: 140,
    reductionUm: [60, 75],
    driveUpMm: { '1:12': [0.93, 1.1], '1:30': [2.3, 2.8] },
  },
  {
    above: 140,
    upTo: 160,
    reductionUm: [70, 85],
    driveUpMm: { '1:12': [1.05, 1.3], '1:30': [2.65, 3.2] },
  },
  {
    above: 160,
    upTo: 180,
    reductionUm: [80, 95],
    driveUpMm: { '1:12': [1.2, 1.45], '1:30': [3.0, 3.6] },
  },
  {
    above: 180,
    upTo: 200,
    reductionUm: [90, 105],
    driveUpMm: { '1:12': [1.3, 1.6], '1:30': [3.3, 4.0] },
  },
  {
    above: 200,
    upTo: 225,
    reductionUm: [100, 120],
    driveUpMm: { '1:12': [1.45, 1.8], '1:30': [3.7, 4.45] },
  },
  {
    above: 225,
    upTo: 250,
    reductionUm: [110, 130],
    driveUpMm: { '1:12': [1.6, 1.95], '1:30': [4.0, 4.85] },
  },
  {
    above: 250,
    upTo: 280,
    reductionUm: [120, 150],
    driveUpMm: { '1:12': [1.8, 2.15], '1:30': [4.5, 5.4] },
  },
  {
    above: 280,
    upTo: 315,
    reductionUm: [135, 165],
    driveUpMm: { '1:12': [2.0, 2.4], '1:30': [4.95, 6.0] },
  },
  {
    above: 315,
    upTo: 355,
    reductionUm: [150, 180],
    driveUpMm: { '1:12': [2.15, 2.65], '1:30': [5.4, 6.6] },
  },
  {
    above: 355,
    upTo: 400,
    reductionUm: [170, 210],
    driveUpMm: { '1:12': [2.5, 3.0], '1:30': [6.2, 7.6] },
  },
  {
    above: 400,
    upTo: 450,
    reductionUm: [195, 235],
    driveUpMm: { '1:12': [2.8, 3.4], '1:30': [7.0, 8.5] },
  },
  {
    above: 450,
    upTo: 500,
    reductionUm: [215, 265],
    driveUpMm: { '1:12': [3.1, 3.8], '1:30': [7.8, 9.5] },
  },
];
