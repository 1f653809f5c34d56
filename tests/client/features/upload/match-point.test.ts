import { describe, expect, it } from 'vitest';
import { matchPoint, type MatchablePoint } from '#src/features/upload/match-point.ts';

const point = (
  id: number,
  machineTag: string,
  positionCode: string,
  direction: MatchablePoint['direction'],
): MatchablePoint => ({ id, machineTag, positionCode, direction });

const points = [
  point(1, 'P-101', 'M-DE', 'horizontal'),
  point(2, 'P-101', 'M-DE', 'vertical'),
  point(3, 'P-101', 'P-DE', 'horizontal'),
  point(4, 'P-102', 'M-DE', 'horizontal'),
  point(5, 'P-102', 'P-DE', 'axial'),
  point(6, 'P-10', 'M-NDE', 'horizontal'),
];
const route = new Set([1, 2, 3, 5]);
const match = (clues: Partial<Parameters<typeof matchPoint>[0]>) =>
  matchPoint({ filePath: 'export-0001.csv', ...clues }, points, route);

describe('matching a file to a measuring point', () => {
  it('takes the whole label of the comment line', () => {
    expect(match({ asset: 'P-101', point: 'P-101/M-DE/V' })).toEqual({ pointId: 2, by: 'comment' });
  });

  it('takes position and direction of the comment line on the asset it names', () => {
    expect(match({ asset: 'p102', point: 'M-DE horizontal' })?.pointId).toBe(4);
    expect(match({ asset: 'P-102', point: 'M-DE H' })?.pointId).toBe(4);
  });

  it('takes a position without direction where only one point is there', () => {
    expect(match({ asset: 'P-101', point: 'P-DE' })?.pointId).toBe(3);
    expect(match({ asset: 'P-101', point: 'M-DE' })).toBeNull();
  });

  it('prefers the point of the route where a name fits several machines', () => {
    expect(match({ point: 'M-DE/H' })?.pointId).toBe(1);
    expect(matchPoint({ filePath: 'x.csv', point: 'M-DE/H' }, points, new Set())).toBeNull();
  });

  it('matches nothing where asset and point disagree, or the point is not on record', () => {
    expect(match({ asset: 'P-102', point: 'P-101/M-DE/H' })).toBeNull();
    expect(match({ asset: 'P-999', point: 'M-DE/H' })).toBeNull();
    expect(match({ asset: 'P-999', filePath: 'P-101_M-DE_H.csv' })).toBeNull();
    expect(match({ point: 'P-101/M-NDE/H', filePath: 'P-101_M-DE_H.csv' })).toBeNull();
  });

  it.each([
    ['P-101_M-DE_H.csv', 1],
    ['2026-11-30 P101 M-DE vert.csv', 2],
    ['walk7_p-102_p-de_AX_0003.CSV', 5],
    ['P-101/M-DE_V.csv', 2],
    ['P-101_P-DE.csv', 3],
    ['P-10_M-NDE_H.csv', 6],
  ])('reads the file name %s', (filePath, pointId) => {
    expect(match({ filePath })).toEqual({ pointId, by: 'file name' });
  });

  it.each(['P-101_P-DE_V.csv', 'P-101_M-DE.csv', 'M-DE_H.csv', 'measurement 12.csv'])(
    'leaves %s to a person',
    (filePath) => {
      expect(match({ filePath })).toBeNull();
    },
  );

  it('takes the longest name that fits, not one within it', () => {
    const two = [...points, point(7, '2-P-101', 'M-DE', 'horizontal')];
    expect(matchPoint({ filePath: '2-P-101_M-DE_H.csv' }, two, route)?.pointId).toBe(7);
  });

  it('reads position and direction in the file name where a comment line names the asset', () => {
    expect(match({ asset: 'P-102', filePath: 'M-DE_H.csv' })?.pointId).toBe(4);
  });

  it('gives each column of a file its own point', () => {
    const clues = { asset: 'P-101', point: 'P-101/M-DE', filePath: 'a.csv' };
    expect(match({ ...clues, channelName: 'horizontal' })).toEqual({ pointId: 1, by: 'column' });
    expect(match({ ...clues, channelName: 'acceleration vert' })).toBeNull();
    expect(match({ ...clues, channelName: 'V' })?.pointId).toBe(2);
    expect(match({ ...clues, channelName: 'P-DE H' })?.pointId).toBe(3);
    expect(match({ ...clues, channelName: 'channel 1' })).toBeNull();
  });
});
