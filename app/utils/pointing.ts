import type { InjectionKey, Ref } from 'vue';
import type { Finding } from '#shared/readback/finding';

/** The reading that is pointed at: shown on the plan and the rod where it was measured, and gone to in the program. */
export interface Pointing {
  readonly shown: Readonly<Ref<Finding | null>>;
  readonly point: (finding: Finding) => void;
  /** Leaves this reading, if it is still the one shown; every one if none is named. */
  readonly clear: (finding?: Finding) => void;
  readonly go: (finding: Finding) => void;
}

export const POINTING: InjectionKey<Pointing> = Symbol('pointing');
