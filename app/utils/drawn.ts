import { byUnits } from '#shared/measure/units';
import { type Draft, unitsOf } from './draft';
import type { PlanSizes } from './planView';
import type { SectionSizes } from './sectionView';
import { sizesOf } from './sizes';

/** What both views are drawn from. */
export interface DrawnRail extends PlanSizes, Omit<SectionSizes, 'passes'> {
  readonly bitDiameter: number;
  readonly wood: string;
  readonly workZero: 'corner' | 'centre';
}

/** The rail as far as it can be drawn: null while a size it needs cannot be read or the shape is impossible. */
export function drawnRail(draft: Draft): DrawnRail | null {
  const units = unitsOf(draft);
  const { railLength, length, stopMargin, width, depth, bitDiameter, ...sizes } = sizesOf(draft);
  if (railLength === null || length === null || stopMargin === null || width === null || depth === null) return null;
  // The same two defaults that the schema fills in: the drawing shows them before anything else is worked out.
  const railWidth = sizes.railWidth ?? (draft.texts.railWidth.text.trim() === '' ? 3 * width : null);
  const railThickness = sizes.railThickness ?? (draft.texts.railThickness.text.trim() === '' ? byUnits(units, 0.75, 19) : null);
  if (railWidth === null || railThickness === null) return null;
  const possible = length > 0 && stopMargin > 0 && width > 0 && depth > 0 && width < railWidth && depth < railThickness && width <= length;
  if (!possible || railLength / railWidth > 2000) return null;
  const bit = bitDiameter !== null && bitDiameter > 0 ? bitDiameter : width;
  const cornerRadius = draft.picks.ends === 'round' ? width / 2 : Math.min(bit, width) / 2;
  return {
    units, railLength, railWidth, railThickness, length, width, depth, stopMargin, cornerRadius, bitDiameter: bit,
    wood: draft.picks.wood === '' ? 'hardwood' : draft.picks.wood,
    workZero: draft.picks.workZero === 'centre' ? 'centre' : 'corner',
  };
}
