import type { ProgramSummary } from '../makeProgram';
import type { Finding } from '../readback/finding';
import type { SlotSpec } from '../slot/spec';
import type { Bit } from './bit';
import type { OUTCOMES } from './cut';
import type { Holding, Machine } from './machine';

/** A rail's program as the bench needs it: with all that it was made from, as it was then. */
export interface BenchProgram {
  readonly id: string;
  readonly mark: string;
  readonly fileName: string;
  readonly text: string;
  /** Of the text's bytes, hex. */
  readonly sha256: string;
  readonly revision: number;
  readonly spec: SlotSpec;
  readonly summary: ProgramSummary;
  /** What the readback wants to be known before the cut. */
  readonly cautions: readonly Finding[];
  readonly machine: Machine;
  readonly bit: Bit;
  /** Null where the machine's record has no such way of holding. */
  readonly holding: Holding | null;
}

/** A rail that waits to be cut. */
export interface BenchRail {
  readonly id: string;
  readonly name: string;
  /** `2026-12-18`. */
  readonly due: string | null;
  readonly quantity: number;
  readonly cutWell: number;
  readonly spoiled: number;
  /** Number of the drawing's newest revision: above the program's, the program is of an older drawing. */
  readonly revision: number;
  readonly program: BenchProgram;
}

/** A cut of the last day, as a stick on the bench shows it. */
export interface BenchCut {
  readonly id: string;
  readonly railId: string;
  readonly rail: string;
  readonly mark: string;
  readonly outcome: (typeof OUTCOMES)[number];
  readonly reason: string;
  /** ISO 8601. */
  readonly cutAt: string;
  readonly spec: SlotSpec;
}

/** A rail whose drawing was changed since its program was made: not to be cut until it has a new one. */
export interface BenchChanged {
  readonly id: string;
  readonly name: string;
  readonly programId: string;
  readonly mark: string;
}

/** One person's day at the bench: no price and no customer is in it. */
export interface BenchDay {
  readonly rails: readonly BenchRail[];
  readonly cuts: readonly BenchCut[];
  readonly changed: readonly BenchChanged[];
}

/** Whether a rail's program was made from a drawing that has been changed since. */
export const isOlder = ({ revision, program }: BenchRail): boolean => program.revision < revision;
