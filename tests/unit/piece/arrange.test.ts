import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { bradFindings } from '#shared/assembly/fasteners';
import type { CoinKind } from '#shared/coin/tally';
import { formatSize } from '#shared/measure/length';
import { arrange, slotOfRail } from '#shared/piece/arrange';
import { notesFor } from '#shared/piece/notes';
import { hasSentence, jobSentence } from '#shared/piece/sentences';
import type { PieceInput } from '#shared/piece/spec';
import { makeProgram } from '#shared/makeProgram';
import { slotRequestSchema } from '#shared/slot/request';
import { USUAL_SEASONS } from '#shared/wood/movement';
import { boardAtBattens, grooveOverSeasons } from '#shared/wood/seasons';
import { THIRTEEN, pieceOf } from './thirteenStripes';

const coin = (name: string, diameter: number, thickness: number, count: number): CoinKind & { toCome: number } => ({ name, diameter, thickness, count, mass: null, toCome: 0 });
const coins = [coin('Squad', 1.75, 0.125, 12), coin('Cadet', 1.25, 0.118, 20)];

function arranged(change: Partial<PieceInput>, kinds = coins) {
  const answer = arrange(pieceOf({ ...THIRTEEN, ...change }), kinds, []);
  if (!answer.ok) throw new Error(answer.problems.map(({ message }) => message).join(' '));
  return answer.arrangement;
}

describe('a piece with its coins', () => {
  it('has every coin at its place within its groove, no nearer to another or to an end than the gap', () => {
    const { rails } = arranged({});
    expect(rails.reduce((sum, { places }) => sum + places.length, 0)).toBe(32);
    for (const { places, grooveLength } of rails) {
      let end = 0;
      for (const { middle, diameter } of places) {
        expect(middle - diameter / 2 - end).toBeGreaterThanOrEqual(0.25 - 1e-9);
        end = middle + diameter / 2;
      }
      if (places.length > 0) expect(grooveLength - end).toBeGreaterThanOrEqual(0.25 - 1e-9);
    }
  });

  it('says what would make coins fit only where some have no place', () => {
    expect(arranged({}).ways).toEqual([]);
    const short = arranged({ width: 20, unionWidth: 6, railLanes: [10, 13] });
    expect(short.assignment.unplaced.length).toBeGreaterThan(0);
    expect(short.ways.length).toBeGreaterThan(0);
  });

  it('puts no coin under a rail that it would meet', () => {
    const { assignment } = arranged({ railLanes: [8, 10, 12] }, [coin('Tall', 2.75, 0.16, 3), coin('Squad', 1.75, 0.125, 3)]);
    expect(assignment.rails.filter(({ kinds }) => kinds.some(({ name }) => name === 'Tall')).map(({ name }) => name)).toEqual(['A']);
  });

  it('makes a program of every rail, read back and agreeing', () => {
    const piece = pieceOf(THIRTEEN);
    for (const rail of arranged({}).rails) {
      const asked = slotRequestSchema.parse({ ...slotOfRail(piece, rail), name: rail.name, bitDiameter: 0.25, stepdown: 0.09375, wood: 'white-oak' });
      const { readback } = makeProgram(asked);
      expect(readback.verdict).not.toBe('disagrees');
      expect(asked.spec.length).toBeCloseTo(rail.grooveLength, 9);
    }
  });

  it('brings notes of the flag code with a flag board only', () => {
    expect(notesFor('striped-flag').some(({ source }) => source === '4 U.S.C. 8(h)')).toBe(true);
    expect(notesFor('shelf')).toEqual([]);
  });
});

describe('over the seasons', () => {
  it('a groove that only just takes its coin does not in winter; one with play does', () => {
    const groove = { units: 'in', style: 'leaning', width: 0.375, depth: 0.1875, boardDistance: 0.4375 } as const;
    const said = grooveOverSeasons([coin('tight', 1.75, 0.3749, 1), coin('loose', 1.75, 0.125, 1)], groove, 'white-oak', 'flat', USUAL_SEASONS);
    expect(said.map(({ about, severity }) => [about, severity])).toEqual([['tight', 'disagrees'], ['loose', 'agrees']]);
    expect(grooveOverSeasons(coins, groove, 'mdf', 'flat', USUAL_SEASONS)).toEqual([]);
  });

  it('a wide board wants slotted holes at its battens, a narrow one does not', () => {
    // Own arithmetic from the handbook's figures: 6.2 to 12.0 % in air of 30 and 65 % at 70 °F; 19.5 in × .00274 × 5.8 = 0.31 in.
    const [wide] = boardAtBattens(19.5, 'walnut', 'flat', USUAL_SEASONS, 'in');
    expect(wide).toMatchObject({ severity: 'caution', reason: 'slotTheHoles' });
    expect(wide?.measured).toBeCloseTo(0.31, 2);
    expect(boardAtBattens(2, 'walnut', 'quarter', USUAL_SEASONS, 'in')[0]?.severity).toBe('agrees');
  });
});

describe('sentences', () => {
  it('exist for every reason that the rules name', () => {
    // Reasons are the quoted words that stand as a reason in the rules' own sources.
    const sources = ['coin/fitFindings', 'coin/spacing', 'piece/findings', 'assembly/fasteners', 'assembly/finish', 'wood/seasons'];
    const text = sources.map((path) => readFileSync(new URL(`../../../shared/${path}.ts`, import.meta.url), 'utf8')).join('\n');
    const cases = [
      ['rest', 'rattles'], ['rest', 'leansOnRim'], ['rest', 'rimFirst'], ['rest', 'climbsRim'], ['clearance', 'tooThick'], ['proportion', 'ownProportion'], ['railOnBoard', 'tooShort'],
      ['railInLane', 'thickerThanLane'], ['clearOfUnion', 'railOnUnion'], ['clearOfUnion', 'coinsBeforeUnion'], ['railsApart', 'railsMeet'], ['coinsClear', 'meetsRailAbove'], ['liftOut', 'noRoomToLift'],
      ['coinsBacked', 'aboveBoard'], ['sight', 'partHidden'], ['rowsApart', 'noRoomForFinger'], ['rowsApart', 'touch'], ['gap', 'touch'], ['groove', 'throughGroove'], ['groove', 'nearGroove'],
      ['frontFace', 'throughFace'], ['frontFace', 'nearFace'], ['bite', 'misses'], ['bite', 'short'], ['holding', 'shortForBoard'], ['edge', 'nearEdge'], ['grooveTakesCoin', 'tooNarrow'],
      ['boardAtBattens', 'slotTheHoles'], ['start', 'tooLate'], ['fits', 'longerThanDay'], ['fits', 'neverOpen'], ['recoat', 'sandFirst'],
    ] as const;
    for (const [rule, reason] of cases) {
      expect(text).toContain(`'${reason}'`);
      expect(hasSentence(rule, reason)).toBe(true);
    }
    expect(hasSentence('rest', 'neverSaid')).toBe(false);
  });

  it('give the number with its unit and what would work, in both units', () => {
    for (const units of ['in', 'mm'] as const) {
      const k = units === 'in' ? 1 : 25.4;
      const section = { width: 1.25 * k, thickness: 0.75 * k, grooveWidth: 0.375 * k, grooveDepth: 0.1875 * k, stopMargin: k, laneMargin: k };
      const [groove] = bradFindings({ gauge: 18, length: 1.5 * k, below: 0.3 * k }, { units, boardThickness: 0.75 * k, section });
      if (!groove) throw new Error('the groove was looked at');
      expect(jobSentence(groove, units)).toContain(`Keep ${formatSize(k / 8, units)} away`);
    }
  });

  it('leave no gap in any finding of a real piece', () => {
    const { fit, spacing, piece } = arranged({ width: 28, railLanes: [8, 9, 10] }, [...coins, coin('Thin', 1.5, 0.05, 2), coin('Thick', 2, 0.4, 2)]);
    const said = [...fit, ...spacing, ...piece].map((finding) => jobSentence(finding, 'in'));
    expect(said.length).toBeGreaterThan(20);
    for (const sentence of said) expect(sentence).not.toMatch(/undefined|NaN|null| {2}|\s[.,]/);
  });
});
