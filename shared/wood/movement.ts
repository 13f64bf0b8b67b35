import type { Wood } from './woods';
import { type WoodFigures, figuresOf } from './species';

/** How a board was sawn: which way its growth rings run across its width. Unknown counts as tangential, the larger movement. */
export const SAWN = ['flat', 'quarter'] as const;
export type Sawn = (typeof SAWN)[number];

/** Moisture contents, %, between which the simple coefficient holds (Wood Handbook, Eq. 13-2). */
const SIMPLE = { least: 6, most: 14 } as const;
/** Fibre saturation, %: above it wood keeps its size (Wood Handbook, ch. 4). */
const SATURATED = 30;

const coefficientOf = (wood: WoodFigures, sawn: Sawn) => (sawn === 'flat' ? wood.tangential : wood.radial);
const shrinkageOf = (wood: WoodFigures, sawn: Sawn) => (sawn === 'flat' ? wood.shrinkageTangential : wood.shrinkageRadial);

/**
 * Change of a size across the grain from one moisture content (%) to another. Within 6 to 14 %: D C (M₂ − M₁)
 * (Wood Handbook, Eq. 13-2). Beyond, up to 30 %: D (M₂ − M₁) / (30 · 100 / S − 30 + M₁) (Eq. 13-3).
 */
export function changeOfSize(size: number, wood: WoodFigures, sawn: Sawn, from: number, to: number): number {
  const within = Math.min(from, to) >= SIMPLE.least && Math.max(from, to) <= SIMPLE.most;
  if (within) return size * coefficientOf(wood, sawn) * (to - from);
  const [start, end] = [Math.min(from, SATURATED), Math.min(to, SATURATED)];
  return (size * (end - start)) / ((SATURATED * 100) / shrinkageOf(wood, sawn) - SATURATED + start);
}

/**
 * Moisture content, %, that wood comes to in air of a temperature (°F) and relative humidity (%): Wood Handbook,
 * Eq. 4-5, which reproduces Table 4-2.
 */
export function equilibriumMoisture(fahrenheit: number, humidity: number): number {
  const [t, h] = [fahrenheit, humidity / 100];
  const w = 330 + 0.452 * t + 0.00415 * t * t;
  const k = 0.791 + 0.000463 * t - 0.000000844 * t * t;
  const k1 = 6.34 + 0.000775 * t - 0.0000935 * t * t;
  const k2 = 1.09 + 0.0284 * t - 0.0000904 * t * t;
  const kh = k * h;
  return (1800 / w) * (kh / (1 - kh) + (k1 * kh + 2 * k1 * k2 * kh * kh) / (1 + k1 * kh + k1 * k2 * kh * kh));
}

/** A place's air over the year: indoor relative humidity in % in dry winter and damp summer, and what the shop has while it cuts. */
export interface Seasons {
  readonly fahrenheit: number;
  readonly winter: number;
  readonly summer: number;
  readonly shop: number;
}

/** Heated rooms in a cold winter and open windows in summer: common practice, no source. */
export const USUAL_SEASONS: Seasons = { fahrenheit: 70, winter: 30, summer: 65, shop: 45 };

export interface SeasonalMovement {
  /** Moisture content, %, in the shop, in winter, in summer. */
  readonly moisture: { readonly shop: number; readonly winter: number; readonly summer: number };
  /** Change of the size from what it is in the shop; below zero it shrinks. */
  readonly winter: number;
  readonly summer: number;
}

/** How far a size across the grain moves over the year from what it is in the shop; null for sheet goods, which hardly move. */
export function seasonalMovement(size: number, wood: Wood, sawn: Sawn, seasons: Seasons): SeasonalMovement | null {
  const figures = figuresOf(wood);
  if (!figures) return null;
  const at = (humidity: number) => equilibriumMoisture(seasons.fahrenheit, humidity);
  const moisture = { shop: at(seasons.shop), winter: at(seasons.winter), summer: at(seasons.summer) };
  return { moisture, winter: changeOfSize(size, figures, sawn, moisture.shop, moisture.winter), summer: changeOfSize(size, figures, sawn, moisture.shop, moisture.summer) };
}
