import type { Contact } from '#shared/commission/commission';
import type { Stage, StageDays } from '#shared/commission/stages';
import type { WorkInput } from '#shared/commission/work';
import type { Units } from '#shared/measure/units';
import type { Stale, Step } from '#shared/piece/stale';
import type { RailStatus } from '#shared/shop/railStatus';
import { sizeText } from './formText';

// What the commissions' routes answer, as it arrives in a page: times as text.

export interface CommissionRow {
  readonly id: string;
  readonly name: string;
  readonly occasion: string;
  readonly stage: Stage;
  readonly due: string | null;
  readonly units: Units;
  readonly updatedAt: string;
  /** The owner's alone. */
  readonly contact?: Contact;
}

export interface PieceRail {
  readonly id: string;
  readonly label: string;
  readonly name: string;
  readonly status: RailStatus;
  readonly revision: number;
  readonly quantity: number;
  readonly cutWell: number;
  readonly program: { readonly mark: string; readonly revision: number } | null;
}
export interface StepTick {
  readonly step: string;
  readonly done: boolean;
  readonly by: string;
  readonly at: string;
}

export interface CommissionAnswer extends CommissionRow {
  readonly wall: string;
  readonly wishes: string;
  readonly stageDays: StageDays;
  readonly revision: number;
  readonly savedBy: string | null;
  readonly savedAt: string | null;
  readonly work: WorkInput | null;
  readonly rails: readonly PieceRail[];
  readonly ticks: readonly StepTick[];
  readonly made: readonly { readonly step: Step; readonly revision: number; readonly by: string; readonly at: string }[];
  readonly stale: readonly Stale[];
}

/** A size of the work as its box shows it: as typed, or a kept figure as the trade writes it. */
export const shownSize = (raw: string | number | null | undefined, units: Units): string => (typeof raw === 'number' ? sizeText(raw, units) : raw ?? '');

/** How the rims of a piece's kinds are drawn, so that they are told apart in black and white: after four, a mark in the middle as well. */
export const RIMS = ['double', 'reeded', 'single', 'beaded'] as const;
export type Rim = (typeof RIMS)[number];
export const rimOf = (index: number): { readonly rim: Rim; readonly mark: number } => ({ rim: RIMS[index % RIMS.length] ?? 'single', mark: Math.floor(index / RIMS.length) });

/** Money in the shop's cents as figures: `310.00`. */
export const centsWords = (cents: number): string => `${Math.floor(cents / 100)}.${String(cents % 100).padStart(2, '0')}`;

/** A day without its year: `18 Dec`. */
export const shortDay = (day: string): string => new Date(`${day}T00:00:00Z`).toLocaleDateString('en-GB', { day: 'numeric', month: 'short', timeZone: 'UTC' });
