import type { Units } from '#shared/measure/units';
import { type Draft, type Figures, type PickKey, type TextKey, type TrioKey, type Typed, FIGURES, PICK_KEYS, TEXT_KEYS, TRIO, draftOf } from './draft';

/** The page's address holds the whole drawing: `#1.` and JSON in base64url. The number rises when the form changes. */
const VERSION = '1';
/** Far above any honest link; a longer one is not worth reading. */
const LONGEST = 8192;

const toBase64 = (text: string) =>
  btoa(String.fromCharCode(...new TextEncoder().encode(text))).replaceAll('+', '-').replaceAll('/', '_').replaceAll('=', '');

function fromBase64(text: string): string {
  const binary = atob(text.replaceAll('-', '+').replaceAll('_', '/'));
  return new TextDecoder('utf-8', { fatal: true }).decode(Uint8Array.from(binary, (one) => one.charCodeAt(0)));
}

/** Short names that links in the world carry: one may be added, none may change. */
const TEXT_CODES: Readonly<Record<TextKey, string>> = {
  'railLength': 'rl', 'length': 'l', 'stopMargin': 'm', 'width': 'w', 'depth': 'd', 'railWidth': 'rw', 'railThickness': 'rt',
  'bitDiameter': 'b', 'stepdown': 's', 'finishAllowance': 'fa', 'cuttingLength': 'cl', 'colletDiameter': 'cd', 'stickout': 'so',
  'clampHeight': 'ch', 'clampReach': 'cr', 'safeHeight': 'sh', 'feed': 'f', 'plungeFeed': 'p', 'machine.topFeed': 'mf',
  'machine.acceleration': 'ma', 'machine.travel.x': 'mx', 'machine.travel.y': 'my', 'machine.travel.z': 'mz',
  'chipLoadRange.0': 'c0', 'chipLoadRange.1': 'c1', 'options.chordTolerance': 'ot', 'flutes': 'n', 'spindleSpeed': 'r',
  'rampAngle': 'a', 'stepover': 'st', 'machine.spindleRange.0': 'r0', 'machine.spindleRange.1': 'r1', 'name': 't',
  'options.fileEnding': 'oe', 'coinDiameter': 'kd', 'coinThickness': 'kt',
};
const PICK_CODES: Readonly<Record<PickKey, string>> = {
  'ends': 'E', 'wood': 'W', 'direction': 'D', 'bitKind': 'B', 'centreCutting': 'C', 'workZero': 'Z', 'spindle': 'S',
  'machine.heavy': 'H', 'options.lineNumbers': 'N', 'options.lineEndings': 'L', 'options.percent': 'P',
  'options.comments': 'K', 'options.speedWord': 'O', 'options.spindleWait': 'A', 'options.end': 'M', 'options.programUnits': 'U', 'coinBoard': 'Q',
};

/** Only what was typed or picked. */
export function linkOf(draft: Draft): string {
  const texts = TEXT_KEYS.flatMap((key) => {
    const { text, units } = draft.texts[key];
    return text === '' ? [] : [[TEXT_CODES[key], text, ...(units === 'mm' ? [1] : [])]];
  });
  const picks = PICK_KEYS.flatMap((key) => (draft.picks[key] === '' ? [] : [[PICK_CODES[key], draft.picks[key]]]));
  const held = draft.held.map((key) => TRIO.indexOf(key));
  return `#${VERSION}.${toBase64(JSON.stringify([FIGURES.indexOf(draft.figures), held, texts, picks]))}`;
}

const list = (value: unknown): readonly unknown[] => (Array.isArray(value) ? value : []);

/** The drawing in an address, or null where it is damaged or of another version. What the figures say is judged later. */
export function draftFrom(hash: string): Draft | null {
  const [version, code] = hash.replace(/^#/, '').split('.');
  if (version !== VERSION || code === undefined || code.length > LONGEST) return null;
  try {
    const [figuresAt, heldAt, textsAt, picksAt] = list(JSON.parse(fromBase64(code)));
    const figures: Figures | undefined = typeof figuresAt === 'number' ? FIGURES[figuresAt] : undefined;
    const [older, newer] = list(heldAt).map((at): TrioKey | undefined => (typeof at === 'number' ? TRIO[at] : undefined));
    if (!figures || !older || !newer || older === newer) return null;
    const texts: { [Key in TextKey]?: Typed } = {};
    for (const entry of list(textsAt)) {
      const [at, text, millimetres] = list(entry);
      const key = TEXT_KEYS.find((one) => TEXT_CODES[one] === at);
      if (!key || typeof text !== 'string') return null;
      const units: Units = millimetres === 1 ? 'mm' : 'in';
      texts[key] = { text, units };
    }
    const picks: { [Key in PickKey]?: string } = {};
    for (const entry of list(picksAt)) {
      const [at, value] = list(entry);
      const key = PICK_KEYS.find((one) => PICK_CODES[one] === at);
      if (!key || typeof value !== 'string') return null;
      picks[key] = value;
    }
    return draftOf(texts, picks, figures, [older, newer]);
  } catch {
    return null;
  }
}
