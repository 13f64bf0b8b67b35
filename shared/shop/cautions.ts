/** Said wherever a router's work can hurt someone: the page of one groove, the bench and the setup sheet. */
export const ROUTER_CAUTIONS = [
  'Eye and ear protection on.',
  'Dust extraction running, a respirator on.',
  'No gloves or loose sleeves near the cutter.',
  'Clamps clear of the path.',
  'First run in air, bit lifted above the clamps.',
  'Hand on the stop for the first pass.',
] as const;
export const LAST_WORD = "The machine's manual, the bit maker's limits and your local rules come first.";
