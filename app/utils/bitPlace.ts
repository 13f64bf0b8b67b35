import type { InjectionKey, Ref } from 'vue';

/** Where the bit's centre is seen from above, from the rail's front left corner; null before its place is known. */
export interface BitPlace {
  readonly x: number;
  readonly y: number;
}

/** The playing bit, handed past the drawing to the one mark that moves: the rest of the sheet is not redrawn. */
export const BIT_PLACE: InjectionKey<Readonly<Ref<BitPlace | null>>> = Symbol('bit place');
