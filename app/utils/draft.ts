import type { Units } from '#shared/measure/units';

/** Sizes typed as lengths, in the trade's notation. `railLength` is the page's own: slot length and two stop margins make it. */
export const SIZE_KEYS = [
  'railLength', 'length', 'stopMargin', 'width', 'depth', 'railWidth', 'railThickness', 'bitDiameter', 'stepdown',
  'finishAllowance', 'cuttingLength', 'colletDiameter', 'stickout', 'clampHeight', 'clampReach', 'safeHeight',
  'coinDiameter', 'coinThickness',
] as const;
export type SizeKey = (typeof SIZE_KEYS)[number];

/** The coin that stands in the section: on the drawing and in the link, never in the program's request. */
export const COIN_KEYS = ['coinDiameter', 'coinThickness'] as const satisfies readonly SizeKey[];
export type CoinKey = (typeof COIN_KEYS)[number];

/** Plain numbers that count lengths (per minute, per tooth, …): these follow a change of units. */
export const RATE_KEYS = [
  'feed', 'plungeFeed', 'machine.topFeed', 'machine.acceleration', 'machine.travel.x', 'machine.travel.y', 'machine.travel.z',
  'chipLoadRange.0', 'chipLoadRange.1', 'options.chordTolerance',
] as const;
export type RateKey = (typeof RATE_KEYS)[number];

/** Plain numbers without a length in them. */
export const COUNT_KEYS = ['flutes', 'spindleSpeed', 'rampAngle', 'stepover', 'machine.spindleRange.0', 'machine.spindleRange.1'] as const;
export type CountKey = (typeof COUNT_KEYS)[number];

/** Whether a board stands behind the rail's back edge, as on a piece: '' yes, 'none'. Of the coin's picture, like its sizes. */
export const hasBoard = (draft: Draft): boolean => draft.picks.coinBoard === '';

export const WORD_KEYS = ['name', 'options.fileEnding'] as const;
export type WordKey = (typeof WORD_KEYS)[number];

export const TEXT_KEYS = [...SIZE_KEYS, ...RATE_KEYS, ...COUNT_KEYS, ...WORD_KEYS] as const;
export type TextKey = (typeof TEXT_KEYS)[number];

/** What is picked rather than typed; the empty string stands for the default. */
export const PICK_KEYS = [
  'ends', 'wood', 'direction', 'bitKind', 'centreCutting', 'workZero', 'spindle', 'machine.heavy',
  'options.lineNumbers', 'options.lineEndings', 'options.percent', 'options.comments', 'options.speedWord',
  'options.spindleWait', 'options.end', 'options.programUnits',
  'coinBoard',
] as const;
export type PickKey = (typeof PICK_KEYS)[number];

/** How sizes are shown: inches as fractions, inches as decimals, or millimetres. */
export const FIGURES = ['fractions', 'decimals', 'mm'] as const;
export type Figures = (typeof FIGURES)[number];

/** A figure exactly as typed, and the units the drawing was in at that moment. Neither changes when the drawing's do. */
export interface Typed {
  readonly text: string;
  readonly units: Units;
}

/** Two of these hold, the third follows. */
export const TRIO = ['railLength', 'stopMargin', 'length'] as const;
export type TrioKey = (typeof TRIO)[number];

/** Everything somebody has put on the drawing: text only, nothing worked out. */
export interface Draft {
  readonly figures: Figures;
  readonly texts: Readonly<Record<TextKey, Typed>>;
  readonly picks: Readonly<Record<PickKey, string>>;
  /** The two that hold, the least recently typed first. */
  readonly held: readonly [TrioKey, TrioKey];
}

export const unitsOf = (draft: Draft): Units => (draft.figures === 'mm' ? 'mm' : 'in');
export const isTrio = (key: TextKey): key is TrioKey => TRIO.some((one) => one === key);
export const isSize = (key: TextKey): key is SizeKey => SIZE_KEYS.some((one) => one === key);
export const isCoin = (key: TextKey): key is CoinKey => COIN_KEYS.some((one) => one === key);
export const isRate = (key: TextKey): key is RateKey => RATE_KEYS.some((one) => one === key);

/** The one of the three that follows the other two. */
export function follower(draft: Draft): TrioKey {
  return TRIO.find((key) => !draft.held.includes(key)) ?? 'length';
}

/** Types a text. Typed into the one that follows, it holds from now on, and the least recently typed other one gives way. */
export function withText(draft: Draft, key: TextKey, text: string): Draft {
  const texts = { ...draft.texts, [key]: { text, units: unitsOf(draft) } };
  if (!isTrio(key)) return { ...draft, texts };
  const [older, newer] = draft.held;
  return { ...draft, texts, held: [newer === key ? older : newer, key] };
}

export function withPick(draft: Draft, key: PickKey, value: string): Draft {
  return { ...draft, picks: { ...draft.picks, [key]: value } };
}

const record = <Key extends string, Value>(keys: readonly Key[], value: (key: Key) => Value) =>
  Object.fromEntries(keys.map((key) => [key, value(key)])) as Record<Key, Value>;

/** A draft with these texts and picks and everything else left at its default. */
export function draftOf(
  given: { readonly [Key in TextKey]?: Typed | undefined },
  picks: { readonly [Key in PickKey]?: string | undefined },
  figures: Figures,
  held: readonly [TrioKey, TrioKey],
): Draft {
  const units: Units = figures === 'mm' ? 'mm' : 'in';
  return {
    figures,
    held,
    texts: record(TEXT_KEYS, (key) => given[key] ?? { text: '', units }),
    picks: record(PICK_KEYS, (key) => picks[key] ?? ''),
  };
}

const inches = (text: string): Typed => ({ text, units: 'in' });

/** What the page opens with: rail A of the thirteen-stripe board. */
export const FIRST_DRAFT: Draft = draftOf(
  {
    'railLength': inches('26 1/4'), 'stopMargin': inches('7/8'), 'width': inches('3/8'), 'depth': inches('3/16'),
    'railWidth': inches('1 1/4'), 'railThickness': inches('3/4'), 'bitDiameter': inches('1/4'), 'stepdown': inches('3/32'),
    'coinDiameter': inches('1 3/4'), 'coinThickness': inches('0.125'),
    'flutes': inches('2'), 'spindleSpeed': inches('16000'), 'feed': inches('100'), 'plungeFeed': inches('25'),
  },
  { wood: 'white-oak' },
  'fractions',
  ['railLength', 'stopMargin'],
);
