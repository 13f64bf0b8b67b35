import type { Units } from '#shared/measure/units';
import type { Readback } from '#shared/readback/finding';
import type { Bit, KeptBit } from '#shared/shop/bit';
import type { WidthMeasured } from '#shared/shop/bitCorrection';
import type { OUTCOMES } from '#shared/shop/cut';
import type { Machine } from '#shared/shop/machine';
import type { RailStatus } from '#shared/shop/railStatus';
import type { OwnWood } from '#shared/shop/wood';
import type { SlotSpec } from '#shared/slot/spec';

// What the shop's routes answer, as it arrives in a page: times as text.

/** A page of a list. */
export interface ListAnswer<Row> {
  readonly rows: readonly Row[];
  readonly next: string | null;
}

export interface RecordRow<Spec> {
  readonly id: string;
  readonly name: string;
  readonly spec: Spec;
  readonly createdAt: string;
  readonly updatedAt: string;
}
export type MachineRow = RecordRow<Machine>;
export type BitRow = RecordRow<Bit>;
export type WoodRow = RecordRow<OwnWood>;

/** One bit's own page. */
export interface BitAnswer extends RecordRow<KeptBit> {
  readonly minutes: number;
  readonly replacedAt: string | null;
}

export interface RailRow {
  readonly id: string;
  readonly name: string;
  readonly status: RailStatus;
  readonly revision: number;
  readonly wood: string;
  readonly quantity: number;
  readonly due: string | null;
  readonly updatedAt: string;
}

export interface ProgramRow {
  readonly id: string;
  readonly mark: string;
  readonly fileName: string;
  readonly rail: string;
  readonly railId: string;
  readonly revision: number;
  /** The rail's newest revision. */
  readonly newest: number;
  readonly madeBy: string;
  readonly madeAt: string;
}

/** One program's own page: everything it was made from, as it was then. */
export interface ProgramAnswer extends ProgramRow {
  readonly machineId: string;
  readonly bitId: string;
  readonly sha256: string;
  readonly text: string;
  readonly spec: SlotSpec;
  readonly machine: Machine;
  readonly bit: Bit & { readonly acceptedDiameter?: number | null };
  readonly holding: number;
  readonly readback: Readback;
}

export type Outcome = (typeof OUTCOMES)[number];

export interface CutRow {
  readonly id: string;
  readonly rail: string;
  readonly railId: string;
  readonly mark: string;
  readonly programId: string;
  readonly machine: string;
  readonly bit: string;
  readonly by: string;
  readonly outcome: Outcome;
  readonly reason: string;
  readonly seconds: number | null;
  readonly widths: readonly number[];
  readonly depths: readonly number[];
  readonly cutAt: string;
}

export interface DeedRow {
  readonly id: number;
  readonly who: string | null;
  readonly what: string;
  readonly subject: string;
  readonly at: string;
}

export interface WidthRow extends WidthMeasured {
  readonly key: string;
  readonly mark: string;
  readonly place: number;
  readonly cutAt: string;
}

/** What was measured with a bit and what was made of it. */
export interface CorrectionAnswer {
  readonly widths: readonly WidthRow[];
  readonly history: readonly { readonly id: string; readonly units: Units; readonly diameter: number; readonly spread: number; readonly count: number; readonly acceptedBy: string; readonly acceptedAt: string }[];
  /** Which of them holds now. */
  readonly inUse: string | null;
}

/** One column of a list. `sort` is what the list's route calls it; a column without one cannot be sorted by. */
export interface ListColumn<Row> {
  readonly key: string;
  readonly head: string;
  readonly sort?: string;
  readonly text: (row: Row) => string;
  /** A moment rather than words: `text` gives it as ISO 8601. */
  readonly moment?: boolean;
  readonly to?: (row: Row) => string | null;
  /** Figures stand to the right, marks in mono, notes may wrap, rows of figures may not. */
  readonly kind?: 'figure' | 'mono' | 'wide' | 'keep';
}
