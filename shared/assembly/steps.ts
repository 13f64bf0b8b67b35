import { factsOf } from '../piece/kinds';
import { placeRails } from '../piece/rails';
import type { PieceSpec } from '../piece/spec';
import type { Build } from '../wood/cutList';
import type { Caution } from './cautions';
import { type BradGauge, bradPlaces, chooseBrad } from './fasteners';
import type { FinishName } from './finish';
import { gluePlan } from './gluing';

/** One step at the bench, ticked off by its `id`, which stays while the step's own inputs stay. */
export interface BenchStep {
  readonly id: string;
  readonly words: string;
  readonly cautions: readonly Caution[];
}

/** How a piece's surface is coloured before its finish. */
export const COLOURS = ['none', 'torch', 'stain'] as const;
export type Colour = (typeof COLOURS)[number];

export interface Surface {
  readonly colour: Colour;
  readonly finish: FinishName;
}

/** Finishes whose rags heat up by themselves as they dry. */
const OILY: readonly FinishName[] = ['drying-oil', 'oil-polyurethane'];

/**
 * The steps from sawn parts to a piece on the wall, in order. Colour comes before glue and finish: bare wood only.
 * Rails are nailed before the battens, whose places would hide their brads.
 */
export function benchSteps(piece: PieceSpec, build: Build, surface: Surface, gauge: BradGauge): BenchStep[] {
  const facts = factsOf(piece.kind);
  const step = (id: string, words: string, ...cautions: Caution[]): BenchStep => ({ id, words, cautions });
  const coloured = surface.colour === 'torch' ? [step('colour', 'Char the bare faces, brush and wipe them clean.', 'torch')]
    : surface.colour === 'stain' ? [step('colour', 'Stain the bare faces and wipe them dry.', 'rags')] : [];
  const { panels, clamps } = gluePlan(piece, build.boardThickness);
  const glue = piece.lanes < 2 ? [] : [step('glue', `Glue the ${facts.behind ? 'strip' : facts.lane}s edge to edge in ${panels.length === 1 ? 'one panel' : `${panels.length} panels, then these to each other`}, with ${clamps} clamps.`)];
  const brad = facts.behind ? null : chooseBrad({ units: piece.units, boardThickness: build.boardThickness, section: piece.section }, gauge);
  const rails = facts.behind ? [] : placeRails(piece).map(({ name, length }) => {
    const places = bradPlaces(length, gauge, piece.units);
    const how = places[1]?.order === 2 ? 'Hold it in place and nail along' : 'Clamp it, nail both ends, then towards the middle';
    return brad ? step(`rail ${name}`, `Rail ${name}: set it to the rod. ${how}, ${places.length} brads level from behind.`, 'brads')
      : step(`rail ${name}`, `Rail ${name}: set it to the rod and glue it. No ${gauge} gauge brad holds here without coming near the groove or the face.`);
  });
  const battens = facts.behind || build.batten.count === 0 ? [] : [step('battens', `Fasten the ${build.batten.count} battens across the back, set to the rod.`, 'brads')];
  const finish = step('finish', 'Finish the faces and edges; keep the film thin in the grooves.', ...(OILY.includes(surface.finish) ? ['rags' as const] : []));
  const grooves = facts.behind ? [step('grooves', 'Cut the grooves on the machine from their programs.', 'router', 'always')] : [];
  return [...coloured, ...glue, ...grooves, ...rails, ...battens, finish, step('coins', 'Try every kind of coin in its groove.'), step('hang', 'Fit the hardware and hang the piece.', 'hanging')];
}
