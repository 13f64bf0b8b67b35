/** The standard views; the last one stays with the bit. */
export const VIEWS = ['corner', 'above', 'front', 'end', 'bit'] as const;
export type View = (typeof VIEWS)[number];

export const VIEW_WORDS: Readonly<Record<View, string>> = { corner: 'Corner', above: 'Above', front: 'Front', end: 'End', bit: 'At the bit' };
