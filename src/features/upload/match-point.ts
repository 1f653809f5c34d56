import { directionLetter, type PointChoice } from '#shared/contracts/measuring-point.ts';
import { directionOf, indexOfTokens, sameTokens, tokensOf } from './name-tokens.ts';

export type MatchablePoint = Pick<PointChoice, 'id' | 'machineTag' | 'positionCode' | 'direction'>;

/** What may tell which point a channel was recorded at. */
export interface PointClues {
  /** The file's comment lines. */
  asset?: string | undefined;
  point?: string | undefined;
  /** With the folders it came in, if any. */
  filePath: string;
  /** The column's name, where the file has several channels. */
  channelName?: string | undefined;
}

export type MatchedBy = 'comment' | 'column' | 'file name' | 'hand';
export interface PointMatch {
  pointId: number;
  by: Extract<MatchedBy, 'comment' | 'column' | 'file name'>;
}

/**
 * Finds the measuring point of one channel: by the comment lines first, with the column's name where
 * there are several channels, then by the file's name. A clue that fits several points is decided by
 * the route, and by nobody where that leaves more than one: a wrong point is worse than none.
 *
 * @param points - every point of the site
 * @param routePointIds - the points of the survey's route, which are preferred
 */
export function matchPoint(
  clues: PointClues,
  points: readonly MatchablePoint[],
  routePointIds: ReadonlySet<number>,
): PointMatch | null {
  const one = (found: readonly MatchablePoint[]) => onlyOf(found, routePointIds);
  const { asset, point, channelName, filePath } = clues;
  // An asset nobody knows leaves no candidate: its file belongs to no other machine.
  const candidates = asset === undefined ? points : points.filter((p) => isAsset(p, asset));

  if (channelName !== undefined) {
    const byColumn = one(saidBy(channelName, candidates));
    if (byColumn !== null) return { pointId: byColumn.id, by: 'column' };
    // "point: P-101/M-DE" with the columns "horizontal" and "vertical".
    for (const rest of [point, withoutEnding(filePath)]) {
      if (rest === undefined || !tokensOf(channelName).some(directionOf)) continue;
      const both = one(saidBy(`${rest} ${channelName}`, candidates));
      if (both !== null) return { pointId: both.id, by: 'column' };
    }
    // The comment or the name of a file with several channels can't mean all of them.
    return null;
  }
  if (point !== undefined) {
    const byComment = one(saidBy(point, candidates));
    // A comment that names a point nobody knows must not be overruled by a file's name.
    return byComment === null ? null : { pointId: byComment.id, by: 'comment' };
  }
  const name = withoutEnding(filePath);
  const byName =
    one(namedIn(name.slice(name.lastIndexOf('/') + 1), candidates, asset !== undefined)) ??
    one(namedIn(name, candidates, asset !== undefined));
  return byName === null ? null : { pointId: byName.id, by: 'file name' };
}

const withoutEnding = (path: string) => path.replace(/\.[^./]*$/u, '');

const letterOf = (point: MatchablePoint) => directionLetter[point.direction];

const isAsset = (point: MatchablePoint, asset: string) =>
  sameTokens(tokensOf(point.machineTag), tokensOf(asset));

/** The ways a point is named, the fullest first. */
function namesOf(point: MatchablePoint): { full: string[]; short: string[]; position: string[] } {
  const code = tokensOf(point.positionCode);
  return {
    full: [...tokensOf(point.machineTag), ...code, letterOf(point)],
    short: [...code, letterOf(point)],
    position: code,
  };
}

/** Points a text names and nothing besides. */
function saidBy(text: string, points: readonly MatchablePoint[]): MatchablePoint[] {
  const tokens = tokensOf(text);
  const exact = (name: (point: MatchablePoint) => string[]) =>
    points.filter((point) => sameTokens(tokens, name(point)));
  return firstFound([
    () => exact((point) => namesOf(point).full),
    () => exact((point) => namesOf(point).short),
    () => exact((point) => [...tokensOf(point.machineTag), ...namesOf(point).position]),
    () => exact((point) => namesOf(point).position),
  ]);
}

/** Points whose name stands somewhere in a longer text, such as a file name with a date in it. */
function namedIn(
  text: string,
  points: readonly MatchablePoint[],
  assetIsKnown: boolean,
): MatchablePoint[] {
  const tokens = tokensOf(text);
  const within = (name: (point: MatchablePoint) => string[]) =>
    longest(
      points.filter((point) => indexOfTokens(tokens, name(point)) >= 0),
      (point) => name(point).length,
    );
  return firstFound([
    () => within((point) => namesOf(point).full),
    () => (assetIsKnown ? within((point) => namesOf(point).short) : []),
    // Another direction named means another point, which isn't on record.
    () =>
      tokens.some((token, index) => index > 0 && directionOf(token) !== undefined)
        ? []
        : within((point) => [...tokensOf(point.machineTag), ...namesOf(point).position]),
  ]);
}

function firstFound(tries: readonly (() => MatchablePoint[])[]): MatchablePoint[] {
  for (const attempt of tries) {
    const found = attempt();
    if (found.length > 0) return found;
  }
  return [];
}

/** "M-DE" stands in "PM-DE" too: the longest name that fits is the one meant. */
function longest(points: MatchablePoint[], length: (point: MatchablePoint) => number) {
  const most = Math.max(0, ...points.map(length));
  return points.filter((point) => length(point) === most);
}

function onlyOf(
  found: readonly MatchablePoint[],
  routePointIds: ReadonlySet<number>,
): MatchablePoint | null {
  const onRoute = found.filter((point) => routePointIds.has(point.id));
  const left = onRoute.length > 0 ? onRoute : found;
  return left.length === 1 ? (left[0] ?? null) : null;
}
