import { type JobFinding, type Wanted, isWithin } from '../coin/finding';
import { type Fit, fitOf } from '../coin/fit';
import { SPACING_PRACTICE } from '../coin/spacing';
import type { CoinKind } from '../coin/tally';
import { factsOf, unionOf } from './kinds';
import { type PlacedRail, grooveOf, placeRails, roomFor } from './rails';
import { shareSeen } from './sight';
import { type PieceSpec, offProportion } from './spec';

/** What is looked at on a piece before it is made. */
export const PIECE_RULES = ['proportion', 'railOnBoard', 'railInLane', 'clearOfUnion', 'railsApart', 'coinsClear', 'liftOut', 'coinsBacked', 'sight', 'rowsApart'] as const;
export type PieceFinding = JobFinding<(typeof PIECE_RULES)[number]>;

/** Common practice, no source. */
export const PIECE_PRACTICE = {
  /** Least length of a rail worth cutting. */
  railLength: { in: 4, mm: 100 },
  /** Off the order's proportion by more than this share, the piece is a shop's own: said, not refused. */
  proportion: 0.01,
  /** Eyes above the floor, eyes from the wall, middle of the piece above the floor. */
  eye: { in: [60, 60, 57], mm: [1520, 1520, 1450] },
  /** Share of a face's height to be seen. */
  seen: 3 / 4,
} as const;

/** Which kinds stand in which rail: names by the rail's name. */
export type Standing = Readonly<Record<string, readonly string[]>>;

type Say = (rule: PieceFinding['rule'], about: string, measured: number, wanted: Wanted, bad: 'caution' | 'disagrees', reason: string | null, source?: PieceFinding['source']) => PieceFinding;

const say: Say = (rule, about, measured, wanted, bad, reason, source = 'geometry') => {
  const within = isWithin(wanted, measured);
  const quantity = rule === 'proportion' || rule === 'sight' ? 'share' : 'length';
  return { rule, severity: within ? 'agrees' : bad, about, quantity, wanted, measured, reason: within ? null : reason, source };
};

/** Share of a kind's face seen by somebody standing before the piece. */
function seen(piece: PieceSpec, rail: PlacedRail, { diameter }: CoinKind, fit: Fit): number {
  const [eyeUp, eyeOut, middle] = PIECE_PRACTICE.eye[piece.units];
  const { section } = piece;
  const front = (section.width + section.grooveWidth) / 2; // the groove's front wall, out from the board
  const a = (fit.lean * Math.PI) / 180;
  const face = { foot: { out: front, up: -fit.lip }, top: { out: front - diameter * Math.sin(a), up: diameter * Math.cos(a) - fit.lip } };
  const railTop = middle + piece.height / 2 - rail.top; // above the floor
  const above = rail.underRail ? { out: section.width, up: rail.clearAbove } : null;
  return shareSeen(face, { above: eyeUp - railTop, out: eyeOut }, above, { out: front, up: 0 });
}

function ofOneRail(piece: PieceSpec, rail: PlacedRail, kinds: readonly CoinKind[]): PieceFinding[] {
  const { units, section } = piece;
  const { name } = rail;
  const groove = grooveOf(piece);
  const union = unionOf(piece.kind, piece);
  const findings = [
    say('railOnBoard', name, rail.length, { least: PIECE_PRACTICE.railLength[units], most: piece.width }, 'disagrees', 'tooShort', 'common practice'),
    say('railInLane', name, section.thickness, { least: null, most: rail.lane.height }, 'caution', 'thickerThanLane'),
  ];
  if (union && rail.top < union.height) findings.push(say('clearOfUnion', name, rail.left - union.width, { least: 0, most: null }, 'disagrees', 'railOnUnion'));
  for (const kind of kinds) {
    const fit = fitOf(kind, groove);
    if (Number.isNaN(fit.lean) || factsOf(piece.kind).behind) continue;
    const about = `${name}: ${kind.name}`;
    const { stand, lift } = roomFor(fit);
    if (rail.underRail) {
      findings.push(say('coinsClear', about, rail.clearAbove - stand, { least: 0, most: null }, 'disagrees', 'meetsRailAbove'));
      findings.push(say('liftOut', about, rail.clearAbove - lift, { least: 0, most: null }, 'caution', 'noRoomToLift'));
    }
    if (piece.style === 'leaning') {
      // The back's top edge, D cos a above the floor, is what rests on the board.
      const rests = kind.diameter * Math.cos((fit.lean * Math.PI) / 180) - section.grooveDepth;
      findings.push(say('coinsBacked', about, rail.top - rests, { least: 0, most: null }, 'disagrees', 'aboveBoard'));
    }
    const before = union && rail.left < union.width ? rail.top - fit.rise - union.height : null;
    if (before !== null && rail.top >= (union?.height ?? 0)) findings.push(say('clearOfUnion', about, before, { least: 0, most: null }, 'caution', 'coinsBeforeUnion'));
    findings.push(say('sight', about, seen(piece, rail, kind, fit), { least: PIECE_PRACTICE.seen, most: null }, 'caution', 'partHidden', 'common practice'));
  }
  return findings;
}

/** Rows of a shelf: from the back of one row's coins to the next row's, room for a finger. */
function rowsApart(piece: PieceSpec, rails: readonly PlacedRail[], standing: Standing, kinds: readonly CoinKind[]): PieceFinding[] {
  const groove = grooveOf(piece);
  return rails.flatMap((rail, index) => {
    const next = rails[index + 1];
    if (!next) return [];
    const backs = kinds.filter(({ name }) => standing[rail.name]?.includes(name)).map((kind) => fitOf(kind, groove).back).filter((back) => !Number.isNaN(back));
    const room = next.top - rail.top - Math.max(0, ...backs);
    const touching = room < 0;
    return [say('rowsApart', rail.name, room, { least: SPACING_PRACTICE.finger[piece.units], most: null }, touching ? 'disagrees' : 'caution', touching ? 'touch' : 'noRoomForFinger', touching ? 'geometry' : 'common practice')];
  });
}

/** Everything to be said of a piece with these coins in these rails. */
export function pieceFindings(piece: PieceSpec, kinds: readonly CoinKind[], standing: Standing): PieceFinding[] {
  const rails = placeRails(piece);
  const off = offProportion(piece);
  const proportion = off === null ? [] : [say('proportion', '', off, { least: -PIECE_PRACTICE.proportion, most: PIECE_PRACTICE.proportion }, 'caution', 'ownProportion')];
  const apart = rails.slice(1).map((rail, index) => {
    return say('railsApart', `${rails[index]?.name ?? ''} ${rail.name}`, rail.clearAbove, { least: 0, most: null }, 'disagrees', 'railsMeet');
  });
  const each = rails.flatMap((rail) => ofOneRail(piece, rail, kinds.filter(({ name }) => standing[rail.name]?.includes(name))));
  const { behind } = factsOf(piece.kind);
  return [...proportion, ...(behind ? rowsApart(piece, rails, standing, kinds) : apart), ...each];
}
