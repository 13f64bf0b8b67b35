/** Steps of a piece that somebody's hours go into. */
export const LABOUR_STEPS = ['drawing', 'sawing', 'gluing', 'machine set-up', 'assembly', 'finishing', 'packing'] as const;
export type LabourStep = (typeof LABOUR_STEPS)[number];

/** What a step's minutes are counted by. */
export const COUNTED_BY = ['piece', 'part', 'panel', 'rail', 'coat'] as const;
export type CountedBy = (typeof COUNTED_BY)[number];

export interface LabourRate {
  readonly step: LabourStep;
  readonly minutes: number;
  readonly per: CountedBy;
}

/** Where a shop starts before it has times of its own: common practice, no source; it changes them to what it takes. */
export const USUAL_LABOUR: readonly LabourRate[] = [
  { step: 'drawing', minutes: 30, per: 'piece' },
  { step: 'sawing', minutes: 4, per: 'part' },
  { step: 'gluing', minutes: 30, per: 'panel' },
  { step: 'machine set-up', minutes: 15, per: 'rail' },
  { step: 'assembly', minutes: 15, per: 'rail' },
  { step: 'finishing', minutes: 40, per: 'coat' },
  { step: 'packing', minutes: 30, per: 'piece' },
];

/** How many of each a piece has. */
export type Counts = Readonly<Record<CountedBy, number>>;

/** Minutes of each step for a piece, before the shop's own times correct them. A step may have several rates. */
export function usualMinutes(rates: readonly LabourRate[], counts: Counts): { readonly step: LabourStep; readonly minutes: number }[] {
  return LABOUR_STEPS.flatMap((step) => {
    const minutes = rates.filter((rate) => rate.step === step).reduce((all, rate) => all + rate.minutes * counts[rate.per], 0);
    return minutes > 0 ? [{ step, minutes }] : [];
  });
}
