import type { FastenerFinding } from '../assembly/fasteners';
import type { ScheduleFinding } from '../assembly/finish';
import type { JobFinding } from '../coin/finding';
import type { FitFinding } from '../coin/fitFindings';
import type { SpacingFinding } from '../coin/spacing';
import { formatSize } from '../measure/length';
import type { Units } from '../measure/units';
import type { SeasonFinding } from '../wood/seasons';
import type { PieceFinding } from './findings';

/** Every finding of the job before and after the cut. */
export type AnyFinding = FitFinding | SpacingFinding | PieceFinding | FastenerFinding | SeasonFinding | ScheduleFinding;
export type AnyRule = AnyFinding['rule'];

/** What a rule looks at, and what is said where it does not agree: m measured, least and most wanted, who it is about. */
interface Words {
  readonly looks: string;
  readonly bad: Readonly<Record<string, (said: { readonly m: string; readonly least: string; readonly most: string; readonly who: string }) => string>>;
}

const WORDS: Readonly<Record<AnyRule, Words>> = {
  clearance: { looks: 'room for the coin\'s thickness', bad: { tooThick: ({ who }) => `${who} is thicker than the groove is wide. Use a wider groove.` } },
  rest: {
    looks: 'how the coin comes to rest',
    bad: {
      tooThick: ({ who }) => `${who} does not go into the groove.`,
      sinks: ({ who }) => `${who} disappears in the groove. Use a shallower one.`,
      slips: ({ who }) => `${who} slips out over the front lip. Use a deeper groove.`,
      rattles: ({ who }) => `${who} stands upright and only rattles; it does not lean on the board. Use a wider groove.`,
      leansOnRim: ({ who, m }) => `${who} leans ${m} on the groove's rim instead of standing upright. Use a narrower or deeper groove.`,
      rimFirst: ({ who, m }) => `${who} leans ${m} on the groove's rim and does not reach the board.`,
      climbsRim: ({ who }) => `${who} climbs over the groove's rim. Use a deeper groove or a board behind it.`,
    },
  },
  width: { looks: 'groove width', bad: { below: ({ who, m, least }) => `The groove is ${m} wide, tight for ${who}. Common practice is ${least} or more.`, above: ({ who, m, most }) => `The groove is ${m} wide, loose for ${who}. Common practice is ${most} or less.` } },
  depth: { looks: 'groove depth', bad: { below: ({ who, m, least }) => `The groove is ${m} deep, shallow for ${who}. Common practice is ${least} or more.`, above: ({ who, m, most }) => `The groove is ${m} deep for ${who}. Common practice is ${most} or less.` } },
  frontLip: { looks: 'front lip above the coin\'s foot', bad: { below: ({ who, m, least }) => `The front lip stands ${m} above the foot of ${who}. Leave ${least} or more: use a deeper groove.` } },
  hidden: { looks: 'how much of the face is hidden', bad: { above: ({ who, m, most }) => `The groove hides ${m} of the face of ${who}. Keep to ${most} or less.` } },
  footing: { looks: 'how far the wall may tip the coin', bad: { below: ({ who, m, least }) => `${who} tips forward once the wall leans ${m}. Let it bear ${least}: use a wider groove.` } },
  gap: { looks: 'gap between coins', bad: { touch: () => 'The coins touch. Leave a gap.', below: ({ m, least }) => `The gap is ${m}: knocked coins meet. Use ${least} or more.` } },
  reach: { looks: 'how far down a finger comes beside the coin', bad: { below: ({ who, m, least }) => `A finger comes ${m} down beside ${who}. For ${least} use a wider gap.` } },
  proportion: { looks: 'the order\'s proportion', bad: { ownProportion: ({ m }) => `The board is the shop's own proportion, ${m} off Executive Order 10834's 1 to 1.9.` } },
  railOnBoard: { looks: 'rail length', bad: { tooShort: ({ who, m, least }) => `Rail ${who} would be ${m} long. Use a wider board or another place: ${least} or more.` } },
  railInLane: { looks: 'rail within its lane', bad: { thickerThanLane: ({ who, m, most }) => `Rail ${who} is ${m} high on a lane of ${most}. It covers its neighbours.` } },
  clearOfUnion: { looks: 'clear of the union', bad: { railOnUnion: ({ who }) => `Rail ${who} runs onto the union. Make it shorter or move it below.`, coinsBeforeUnion: ({ who }) => `${who} stands before the union. Move the rail down if it is to be seen whole.` } },
  railsApart: { looks: 'rails apart', bad: { railsMeet: ({ who }) => `Rails ${who} meet. Leave a lane between them.` } },
  coinsClear: { looks: 'room under the rail above', bad: { meetsRailAbove: ({ who }) => `${who} meets the rail above. Leave more lanes between the rails.` } },
  liftOut: { looks: 'room to lift a coin out', bad: { noRoomToLift: ({ who }) => `${who} cannot be lifted over the front lip under the rail above. Leave another lane free.` } },
  coinsBacked: { looks: 'board behind the coin\'s top', bad: { aboveBoard: ({ who }) => `${who} leans above the board's top edge. Move the rail down.` } },
  sight: { looks: 'how much of the face the eye sees', bad: { partHidden: ({ who, m, least }) => `Standing before it one sees ${m} of the face of ${who}. Leave more room above for ${least}.` } },
  rowsApart: { looks: 'room behind a row', bad: { touch: ({ who }) => `The coins of row ${who} reach the row behind. Set the grooves further apart.`, noRoomForFinger: ({ who, m, least }) => `Behind row ${who} there is ${m}. For a finger leave ${least}.` } },
  groove: { looks: 'brad clear of the groove', bad: { throughGroove: () => 'The brad comes through the groove. Drive it lower, or use a shorter one.', nearGroove: ({ m, least }) => `The brad passes ${m} from the groove. Keep ${least} away: drive it lower, or use a shorter one.` } },
  frontFace: { looks: 'brad clear of the front face', bad: { throughFace: () => 'The brad comes through the rail\'s front face. Use a shorter one.', nearFace: ({ m, least }) => `The brad ends ${m} from the rail's front face. Keep ${least} away: use a shorter one.` } },
  bite: { looks: 'brad in the rail', bad: { misses: () => 'The brad does not reach the rail. Use a longer one.', short: ({ m, least }) => `The brad goes ${m} into the rail. Use a longer one: ${least} or more.` } },
  holding: { looks: 'brad length for the board', bad: { shortForBoard: ({ m, least }) => `The brad is ${m} long; common practice is ${least}, which the rail does not take. Glue the joint too.` } },
  edge: { looks: 'brad from the rail\'s edge', bad: { nearEdge: ({ m, least }) => `The brad is ${m} from the rail's edge. Keep ${least}, or drill a lead hole.` } },
  grooveTakesCoin: { looks: 'groove in its narrowest season', bad: { tooNarrow: ({ who }) => `In its narrowest season the groove no longer takes ${who}. Cut it wider.` } },
  boardAtBattens: { looks: 'movement of the board over the year', bad: { slotTheHoles: ({ m, most }) => `The board moves ${m} over the year, more than ${most}. Slot the battens' holes, all but one in each.` } },
  start: { looks: 'days in hand before the start', bad: { tooLate: ({ who }) => `${who} would have had to begin already. Drop a coat, use a quicker finish or agree a later day.` } },
  fits: { looks: 'steps within the shop\'s hours', bad: { longerThanDay: ({ who }) => `${who} is longer than a day at the shop. Split it.`, neverOpen: ({ who }) => `The shop has no free open hours for ${who}.` } },
  recoat: { looks: 'wait before the next coat', bad: { sandFirst: ({ who, m, most }) => `After ${who} the next coat waits ${m}, longer than the label's ${most}. Sand first.` } },
};

/** A figure of a finding with its unit. */
function figure(value: number | null | undefined, quantity: JobFinding['quantity'], units: Units): string {
  if (value === null || value === undefined || Number.isNaN(value)) return '';
  switch (quantity) {
    case 'length': return value < 0 ? `${formatSize(-value, units)} too little` : formatSize(value, units);
    case 'share': return `${Math.round(value * 1000) / 10} %`;
    case 'degrees': return `${Math.round(value * 10) / 10}°`;
    case 'days': return `${Math.round(value * 10) / 10} days`;
    case 'grams': return `${Math.round(value)} g`;
    case 'count': case 'words': return String(value);
  }
}

/** A finding in words: what does not agree and what would work, or what was looked at and found. */
export function jobSentence(finding: AnyFinding, units: Units): string {
  const { rule, about, quantity, wanted, measured, reason, severity } = finding;
  const m = figure(measured, quantity, units);
  const words = WORDS[rule];
  const bad = severity === 'agrees' || reason === null ? undefined : words.bad[reason];
  if (bad) return bad({ m, least: figure(wanted?.least, quantity, units), most: figure(wanted?.most, quantity, units), who: about });
  return `${about === '' ? '' : `${about}: `}${words.looks}${m === '' ? '' : `, ${m}`}.`;
}

/** Whether a reason has a sentence of its own. */
export const hasSentence = (rule: AnyRule, reason: string): boolean => reason in WORDS[rule].bad;
