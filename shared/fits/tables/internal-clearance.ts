/**
 * Radial internal clearance of unmounted bearings with a cylindrical bore, µm, as [least, greatest].
 * ISO 5753-1:2009. C2 to C4 to 250 mm equal in two published tables; C5 of ball bearings equal in two to
 * 100 mm, from memory above; C5 of cylindrical rollers and their sizes above 250 mm from one; C5 of
 * spherical rollers from memory. Above 200 mm published tables of ball bearings differ; the values
 * bearing catalogues print are kept. Cylindrical rollers: rings that are not interchanged.
 */
import type { BearingType, ClearanceGroup } from '../fit-types.ts';

type Row = Readonly<Partial<Record<ClearanceGroup, readonly [number, number]>>>;

/** Bores above `above` up to and including `upTo`, mm. */
export interface ClearanceRow {
  above: number;
  upTo: number;
  um: Row;
}

export const internalClearance: Readonly<Record<BearingType, readonly ClearanceRow[]>> = {
  ball: [
    // From 2.5 mm; the smallest sizes belong to the same row in two published tables.
    {
      above: 2.5,
      upTo: 10,
      um: { C2: [0, 7], CN: [2, 13], C3: [8, 23], C4: [14, 29], C5: [20, 37] },
    },
    {
      above: 10,
      upTo: 18,
      um: { C2: [0, 9], CN: [3, 18], C3: [11, 25], C4: [18, 33], C5: [25, 45] },
    },
    {
      above: 18,
      upTo: 24,
      um: { C2: [0, 10], CN: [5, 20], C3: [13, 28], C4: [20, 36], C5: [28, 48] },
    },
    {
      above: 24,
      upTo: 30,
      um: { C2: [1, 11], CN: [5, 20], C3: [13, 28], C4: [23, 41], C5: [30, 53] },
    },
    {
      above: 30,
      upTo: 40,
      um: { C2: [1, 11], CN: [6, 20], C3: [15, 33], C4: [28, 46], C5: [40, 64] },
    },
    {
      above: 40,
      upTo: 50,
      um: { C2: [1, 11], CN: [6, 23], C3: [18, 36], C4: [30, 51], C5: [45, 73] },
    },
    {
      above: 50,
      upTo: 65,
      um: { C2: [1, 15], CN: [8, 28], C3: [23, 43], C4: [38, 61], C5: [55, 90] },
    },
    {
      above: 65,
      upTo: 80,
      um: { C2: [1, 15], CN: [10, 30], C3: [25, 51], C4: [46, 71], C5: [65, 105] },
    },
    {
      above: 80,
      upTo: 100,
      um: { C2: [1, 18], CN: [12, 36], C3: [30, 58], C4: [53, 84], C5: [75, 120] },
    },
    {
      above: 100,
      upTo: 120,
      um: { C2: [2, 20], CN: [15, 41], C3: [36, 66], C4: [61, 97], C5: [90, 140] },
    },
    {
      above: 120,
      upTo: 140,
      um: { C2: [2, 23], CN: [18, 48], C3: [41, 81], C4: [71, 114], C5: [105, 160] },
    },
    {
      above: 140,
      upTo: 160,
      um: { C2: [2, 23], CN: [18, 53], C3: [46, 91], C4: [81, 130], C5: [120, 180] },
    },
    {
      above: 160,
      upTo: 180,
      um: { C2: [2, 25], CN: [20, 61], C3: [53, 102], C4: [91, 147], C5: [135, 200] },
    },
    {
      above: 180,
      upTo: 200,
      um: { C2: [2, 30], CN: [25, 71], C3: [63, 117], C4: [107, 163], C5: [150, 230] },
    },
    { above: 200, upTo: 225, um: { C2: [2, 35], CN: [25, 85], C3: [75, 140], C4: [125, 195] } },
    { above: 225, upTo: 250, um: { C2: [2, 40], CN: [30, 95], C3: [85, 160], C4: [145, 225] } },
  ],
  roller: [
    {
      above: 0,
      upTo: 24,
      um: { C2: [0, 25], CN: [20, 45], C3: [35, 60], C4: [50, 75], C5: [65, 90] },
    },
    {
      above: 24,
      upTo: 30,
      um: { C2: [0, 25], CN: [20, 45], C3: [35, 60], C4: [50, 75], C5: [70, 95] },
    },
    {
      above: 30,
      upTo: 40,
      um: { C2: [5, 30], CN: [25, 50], C3: [45, 70], C4: [60, 85], C5: [80, 105] },
    },
    {
      above: 40,
      upTo: 50,
      um: { C2: [5, 35], CN: [30, 60], C3: [50, 80], C4: [70, 100], C5: [95, 125] },
    },
    {
      above: 50,
      upTo: 65,
      um: { C2: [10, 40], CN: [40, 70], C3: [60, 90], C4: [80, 110], C5: [110, 140] },
    },
    {
      above: 65,
      upTo: 80,
      um: { C2: [10, 45], CN: [40, 75], C3: [65, 100], C4: [90, 125], C5: [130, 165] },
    },
    {
      above: 80,
      upTo: 100,
      um: { C2: [15, 50], CN: [50, 85], C3: [75, 110], C4: [105, 140], C5: [155, 190] },
    },
    {
      above: 100,
      upTo: 120,
      um: { C2: [15, 55], CN: [50, 90], C3: [85, 125], C4: [125, 165], C5: [180, 220] },
    },
    {
      above: 120,
      upTo: 140,
      um: { C2: [15, 60], CN: [60, 105], C3: [100, 145], C4: [145, 190], C5: [200, 245] },
    },
    {
      above: 140,
      upTo: 160,
      um: { C2: [20, 70], CN: [70, 120], C3: [115, 165], C4: [165, 215], C5: [225, 275] },
    },
    {
      above: 160,
      upTo: 180,
      um: { C2: [25, 75], CN: [75, 125], C3: [120, 170], C4: [170, 220], C5: [250, 300] },
    },
    {
      above: 180,
      upTo: 200,
      um: { C2: [35, 90], CN: [90, 145], C3: [140, 195], C4: [195, 250], C5: [275, 330] },
    },
    {
      above: 200,
      upTo: 225,
      um: { C2: [45, 105], CN: [105, 165], C3: [160, 220], C4: [220, 280], C5: [305, 365] },
    },
    {
      above: 225,
      upTo: 250,
      um: { C2: [45, 110], CN: [110, 175], C3: [170, 235], C4: [235, 300], C5: [330, 395] },
    },
    {
      above: 250,
      upTo: 280,
      um: { C2: [55, 125], CN: [125, 195], C3: [190, 260], C4: [260, 330], C5: [370, 440] },
    },
    {
      above: 280,
      upTo: 315,
      um: { C2: [55, 130], CN: [130, 205], C3: [200, 275], C4: [275, 350], C5: [410, 485] },
    },
    {
      above: 315,
      upTo: 355,
      um: { C2: [65, 145], CN: [145, 225], C3: [225, 305], C4: [305, 385], C5: [455, 535] },
    },
    {
      above: 355,
      upTo: 400,
      um: { C2: [100, 190], CN: [190, 280], C3: [280, 370], C4: [370, 460], C5: [510, 600] },
    },
    {
      above: 400,
      upTo: 450,
      um: { C2: [110, 210], CN: [210, 310], C3: [310, 410], C4: [410, 510], C5: [565, 665] },
    },
    {
      above: 450,
      upTo: 500,
      um: { C2: [110, 220], CN: [220, 330], C3: [330, 440], C4: [440, 550], C5: [625, 735] },
    },
  ],
  'spherical roller': [
    {
      above: 18,
      upTo: 24,
      um: { C2: [10, 20], CN: [20, 35], C3: [35, 45], C4: [45, 60], C5: [60, 75] },
    },
    {
      above: 24,
      upTo: 30,
      um: { C2: [15, 25], CN: [25, 40], C3: [40, 55], C4: [55, 75], C5: [75, 95] },
    },
    {
      above: 30,
      upTo: 40,
      um: { C2: [15, 30], CN: [30, 45], C3: [45, 60], C4: [60, 80], C5: [80, 100] },
    },
    {
      above: 40,
      upTo: 50,
      um: { C2: [20, 35], CN: [35, 55], C3: [55, 75], C4: [75, 100], C5: [100, 125] },
    },
    {
      above: 50,
      upTo: 65,
      um: { C2: [20, 40], CN: [40, 65], C3: [65, 90], C4: [90, 120], C5: [120, 150] },
    },
    {
      above: 65,
      upTo: 80,
      um: { C2: [30, 50], CN: [50, 80], C3: [80, 110], C4: [110, 145], C5: [145, 180] },
    },
    {
      above: 80,
      upTo: 100,
      um: { C2: [35, 60], CN: [60, 100], C3: [100, 135], C4: [135, 180], C5: [180, 225] },
    },
    {
      above: 100,
      upTo: 120,
      um: { C2: [40, 75], CN: [75, 120], C3: [120, 160], C4: [160, 210], C5: [210, 260] },
    },
    {
      above: 120,
      upTo: 140,
      um: { C2: [50, 95], CN: [95, 145], C3: [145, 190], C4: [190, 240], C5: [240, 300] },
    },
    {
      above: 140,
      upTo: 160,
      um: { C2: [60, 110], CN: [110, 170], C3: [170, 220], C4: [220, 280], C5: [280, 350] },
    },
    {
      above: 160,
      upTo: 180,
      um: { C2: [65, 120], CN: [120, 180], C3: [180, 240], C4: [240, 310], C5: [310, 390] },
    },
    {
      above: 180,
      upTo: 200,
      um: { C2: [70, 130], CN: [130, 200], C3: [200, 260], C4: [260, 340], C5: [340, 430] },
    },
    {
      above: 200,
      upTo: 225,
      um: { C2: [80, 140], CN: [140, 220], C3: [220, 290], C4: [290, 380], C5: [380, 470] },
    },
    {
      above: 225,
      upTo: 250,
      um: { C2: [90, 150], CN: [150, 240], C3: [240, 320], C4: [320, 420], C5: [420, 520] },
    },
  ],
};
