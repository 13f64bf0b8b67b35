import { MM_PER_INCH, type Units } from '../measure/units';
import type { WoodKind } from '../wood/woods';
import { WOOD_FACTS } from '../wood/woods';
import type { SlotSpec } from './spec';

/** A range of chip load, length units per tooth, and whose figures they are. */
export interface ChipLoadBand {
  readonly least: number;
  readonly most: number;
  readonly source: 'common practice' | "the bit's maker";
}

/** Inch per tooth on industrial machines, by cutter diameter in inches: a typical shop chart (common practice, no source). */
const CHART: readonly { readonly diameter: number; readonly band: Readonly<Record<WoodKind, readonly [number, number]>> }[] = [
  { diameter: 1 / 8, band: { hardwood: [0.003, 0.005], softwood: [0.004, 0.006], plywood: [0.004, 0.006], mdf: [0.004, 0.007] } },
  { diameter: 1 / 4, band: { hardwood: [0.009, 0.011], softwood: [0.011, 0.013], plywood: [0.011, 0.013], mdf: [0.013, 0.016] } },
  { diameter: 3 / 8, band: { hardwood: [0.015, 0.017], softwood: [0.017, 0.02], plywood: [0.017, 0.02], mdf: [0.02, 0.023] } },
  { diameter: 1 / 2, band: { hardwood: [0.019, 0.021], softwood: [0.021, 0.023], plywood: [0.021, 0.023], mdf: [0.025, 0.027] } },
];

/** Between two rows the chart is read along a straight line; below it in proportion to the diameter; above it its last row holds. */
function readChart(diameter: number, kind: WoodKind): readonly [number, number] {
  const above = CHART.findIndex((row) => row.diameter >= diameter);
  const last = CHART[CHART.length - 1];
  const row = CHART[above] ?? last;
  if (!row) return [0, 0];
  const high = row.band[kind];
  if (above < 0) return high;
  const below = CHART[above - 1];
  const low = below?.band[kind] ?? [0, 0];
  const from = below?.diameter ?? 0;
  const t = (diameter - from) / (row.diameter - from);
  return [low[0] + t * (high[0] - low[0]), low[1] + t * (high[1] - low[1])];
}

/**
 * The chip load advised for a bit in a wood, in the spec's units per tooth: the maker's own figures where given, the
 * chart for a heavy machine, else a third to a half of the chart for a light one (common practice, no source).
 */
export function advisedChipLoad(
  spec: Pick<SlotSpec, 'units' | 'bitDiameter' | 'wood' | 'chipLoadRange'> & { readonly machine: { readonly heavy?: boolean | undefined } | null },
): ChipLoadBand {
  if (spec.chipLoadRange) {
    return { least: spec.chipLoadRange[0], most: spec.chipLoadRange[1], source: "the bit's maker" };
  }
  const scale: Record<Units, number> = { in: 1, mm: MM_PER_INCH };
  const unit = scale[spec.units];
  const [low, high] = readChart(spec.bitDiameter / unit, WOOD_FACTS[spec.wood].kind);
  const [least, most] = spec.machine?.heavy ? [low, high] : [low / 3, high / 2];
  return { least: least * unit, most: most * unit, source: 'common practice' };
}

/** Feed per tooth from feed, speed and flutes: fz = F / (n z) (general machining formula; Machinery's Handbook, from memory). */
export function chipLoad(spec: Pick<SlotSpec, 'feed' | 'spindleSpeed' | 'flutes'>): number {
  return spec.feed / (spec.spindleSpeed * spec.flutes);
}

/** Feed that gives a chip load: F = n z fz (the same). */
export function feedFor(load: number, spec: Pick<SlotSpec, 'spindleSpeed' | 'flutes'>): number {
  return load * spec.spindleSpeed * spec.flutes;
}
