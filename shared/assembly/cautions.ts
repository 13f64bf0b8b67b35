/** Work that can hurt somebody, each with what is said where it is done. */
export const CAUTIONS = {
  router: 'Wear eye and ear protection. Run dust extraction and wear a respirator. No gloves or loose sleeves near the cutter. Keep clamps clear of the path. Keep a hand on the stop for the first pass. Make the first run in air.',
  brads: 'Keep fingers clear of the line of the brad: it can turn with the grain and come out.',
  torch: 'Char bare wood only, clear of finish and dust. Keep an extinguisher at hand. Watch for fire for one hour afterwards.',
  rags: 'Oily rags catch fire by themselves. Lay them flat outside, or put them in a lidded metal can of water.',
  hanging: 'The wall and its fixings are the installer\'s to judge.',
  always: 'The machine\'s manual, the bit maker\'s limits and your local rules come first.',
} as const;
export type Caution = keyof typeof CAUTIONS;
