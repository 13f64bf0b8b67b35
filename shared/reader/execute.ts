import type { Units } from '../measure/units';
import { readError } from './errors';
import { type Machine, changeCut, changeModes } from './machine';
import { gGroup, mGroup } from './modalGroups';
import { AFTER_END, DEFAULTS } from './modes';
import { move } from './move';
import type { Modes, ReadError, Word } from './motion';
import { PLANES } from './planes';
import { AXES, type Letter, type Request, bitOf, findWord, gCode, has, isClose, isG, isM, mCode, placeOf, shown, valueOf } from './request';
import { placeOfLine } from './scan';

const G = {
  nonModal: gGroup('nonModal'),
  motion: gGroup('motion'),
  plane: gGroup('plane'),
  distance: gGroup('distance'),
  feedMode: gGroup('feedMode'),
  units: gGroup('units'),
  radiusCompensation: gGroup('radiusCompensation'),
  lengthOffset: gGroup('lengthOffset'),
  workOffset: gGroup('workOffset'),
  pathControl: gGroup('pathControl'),
};
const M = {
  stopping: mGroup('stopping'),
  toolChange: mGroup('toolChange'),
  spindle: mGroup('spindle'),
  coolant: mGroup('coolant'),
  overrides: mGroup('overrides'),
};

/** Words that mean something on any line. */
const ALWAYS_USED = AXES | bitOf('F') | bitOf('S') | bitOf('T');

/** What the lines between set-up and end are made of. */
const MOTION_GROUP = 1 << G.motion;
const CUTTING = AXES | bitOf('F') | bitOf('I') | bitOf('J') | bitOf('K') | bitOf('R');

type MotionCode = 0 | 1 | 2 | 3;
type Executed = ReadError | null;

/**
 * Executes one line in the order of NISTIR 6556 Table 8. Comments (item 1) do nothing; items 18 (G98, G99: used by canned
 * cycles alone) and 19 (refused by name) have nothing to do here.
 */
export function execute(machine: Machine, request: Request): Executed {
  const stated = gCode(request, G.motion);
  const code = (request.letters & AXES) === 0 ? null : asMotion(stated ?? machine.modes.motion);
  const error = checkMotion(machine, request, stated, code) ?? checkUnused(machine, request, code);
  if (error !== null) return error;
  if (request.mGroups === 0 && (request.gGroups & ~MOTION_GROUP) === 0 && (request.letters & ~CUTTING) === 0)
    return setFeed(machine, request, code) ?? perform(machine, request, stated, code); // the common line asks for nothing else
  return (
    setFeed(machine, request, code) ?? // 2, 3
    setSpeed(machine, request) ?? // 4
    selectTool(machine, request) ?? // 5
    switchMachine(machine, request) ?? // 6 to 9
    dwell(machine, request) ?? // 10
    setUnitsAndPlane(machine, request) ?? // 11, 12
    setOffsets(machine, request) ?? // 13 to 15
    setPath(machine, request) ?? // 16, 17
    perform(machine, request, stated, code) ?? // 20
    stop(machine, request) // 21
  );
}

const asMotion = (code: number | null): MotionCode | null => (code === 0 || code === 1 || code === 2 || code === 3 ? code : null);

/** Axis words that lack a motion, and a motion that lacks its axis words. */
function checkMotion(machine: Machine, request: Request, stated: number | null, code: MotionCode | null): Executed {
  if (code !== null) return null;
  if ((request.letters & AXES) === 0) {
    if (asMotion(stated) === null) return null;
    const { at } = placeOfG(request, G.motion);
    return stated === 0 || stated === 1 ? readError('axisWordsMissing', at, `G${stated}`) : readError('arcEndMissing', at);
  }
  const word = findWord(request, ({ letter }) => (AXES & bitOf(letter)) !== 0);
  const unstated = (stated ?? machine.modes.motion) === null;
  return readError(unstated ? 'noMotionMode' : 'axisWordsForbidden', placeOf(request, word), word === null ? '' : shown(word));
}

/** A word that nothing on the line uses is an error: "extra words" (Appendix A). */
function checkUnused(machine: Machine, request: Request, code: MotionCode | null): Executed {
  let used = ALWAYS_USED;
  if (gCode(request, G.nonModal) === 4) used |= bitOf('P');
  if (code === 2 || code === 3) {
    const [first, second] = PLANES[planeOf(gCode(request, G.plane) ?? machine.modes.plane)].offsets;
    used |= bitOf('R') | bitOf(first) | bitOf(second);
  }
  if ((request.letters & ~used) === 0) return null;
  const word = findWord(request, ({ letter }) => letter !== 'G' && letter !== 'M' && (bitOf(letter) & ~used) !== 0);
  return readError('unusedWord', placeOf(request, word), word === null ? '' : shown(word));
}

const planeOf = (code: number | null): 17 | 18 | 19 => (code === 18 || code === 19 ? code : DEFAULTS.plane);

/** Items 2 and 3: G93 and G94, then F. Under G93 an F belongs to its own line's cut and is ignored elsewhere (3.5.19). */
function setFeed(machine: Machine, request: Request, code: MotionCode | null): Executed {
  const mode = gCode(request, G.feedMode);
  if (mode === 93 || mode === 94) {
    const other = mode !== (machine.modes.feedMode ?? DEFAULTS.feedMode);
    changeModes(machine, { feedMode: mode, feed: other ? null : machine.modes.feed });
  }
  if (has(request, 'F') && valueOf(request, 'F') < 0) return refuseWord(request, 'F', 'negativeFeed');
  const cuts = code !== null && code !== 0;
  if (machine.modes.feedMode === 93) {
    if (cuts && !has(request, 'F')) return readError('inverseTimeFeed', placeOfLine(request.line));
    if (!cuts) return null;
  }
  return has(request, 'F') ? changeCut(machine, machine.modes.motion, valueOf(request, 'F')) : null;
}

function setSpeed(machine: Machine, request: Request): Executed {
  if (!has(request, 'S')) return null;
  const speed = valueOf(request, 'S');
  return speed < 0 ? refuseWord(request, 'S', 'negativeSpeed') : changeModes(machine, { spindleSpeed: speed });
}

function selectTool(machine: Machine, request: Request): Executed {
  if (!has(request, 'T')) return null;
  const slot = valueOf(request, 'T');
  const selectedTool = Math.round(slot);
  if (!isClose(slot, selectedTool)) return refuseWord(request, 'T', 'notAnInteger');
  return selectedTool < 0 ? refuseWord(request, 'T', 'negativeTool') : changeModes(machine, { selectedTool });
}

/** Items 6 to 9: tool change, which stops the spindle (3.6.3), spindle, coolant, overrides. */
function switchMachine(machine: Machine, request: Request): Executed {
  if (request.mGroups === 0) return null;
  if (mCode(request, M.toolChange) !== null) {
    changeModes(machine, { spindle: 'stopped' });
    machine.steps.push({ kind: 'toolChange', ...placeOfM(request, M.toolChange), modes: machine.modes });
  }
  const spindle = mCode(request, M.spindle);
  if (spindle !== null) {
    changeModes(machine, { spindle: spindle === 3 ? 'clockwise' : spindle === 4 ? 'counterclockwise' : 'stopped' });
    machine.steps.push({ kind: 'spindle', ...placeOfM(request, M.spindle), modes: machine.modes });
  }
  const coolant = mCode(request, M.coolant);
  if (coolant !== null) {
    changeModes(machine, { coolant: coolantAfter(machine.modes.coolant, coolant) });
    machine.steps.push({ kind: 'coolant', ...placeOfM(request, M.coolant), modes: machine.modes });
  }
  const overrides = mCode(request, M.overrides);
  return overrides === 48 || overrides === 49 ? changeModes(machine, { overrides }) : null;
}

/** M7 mist, M8 flood, each beside the other; M9 stops both (3.6.4). */
function coolantAfter(before: Modes['coolant'], code: number): Modes['coolant'] {
  if (code === 9) return 'off';
  const added = code === 7 ? 'mist' : 'flood';
  return before === null || before === 'off' || before === added ? added : 'both';
}

function dwell(machine: Machine, request: Request): Executed {
  if (gCode(request, G.nonModal) !== 4) return null;
  const { at } = placeOfG(request, G.nonModal);
  if (!has(request, 'P')) return readError('missingDwell', at);
  const time = valueOf(request, 'P');
  if (time < 0) return refuseWord(request, 'P', 'negativeDwell');
  machine.steps.push({ kind: 'dwell', at, seconds: time * machine.dwellSeconds, modes: machine.modes });
  return null;
}

/** Items 11 and 12. A feed stated in the other unit is no longer known: the report converts none. */
function setUnitsAndPlane(machine: Machine, request: Request): Executed {
  const plane = gCode(request, G.plane);
  if (plane !== null) changeModes(machine, { plane: planeOf(plane) });
  const code = gCode(request, G.units);
  if (code === null) return null;
  const units: Units = code === 20 ? 'in' : 'mm';
  if (machine.units !== null && units !== machine.units) return readError('unitsChange', placeOfG(request, G.units).at, `G${code}`);
  const other = units !== (machine.modes.units ?? machine.unstatedUnits);
  return changeModes(machine, { units, feed: other ? null : machine.modes.feed });
}

/** Items 13 to 15: G40 and G49 (G41, G42 and G43 never come here), then the work offset. */
function setOffsets(machine: Machine, request: Request): Executed {
  if (gCode(request, G.radiusCompensation) === 40) changeModes(machine, { radiusCompensation: 40 });
  if (gCode(request, G.lengthOffset) === 49) changeModes(machine, { lengthOffset: 49 });
  const workOffset = gCode(request, G.workOffset);
  if (workOffset === null) return null;
  const moved = machine.units !== null && workOffset !== (machine.modes.workOffset ?? DEFAULTS.workOffset);
  if (moved) return readError('offsetChange', placeOfG(request, G.workOffset).at, `G${workOffset}`);
  return changeModes(machine, { workOffset });
}

function setPath(machine: Machine, request: Request): Executed {
  const pathControl = gCode(request, G.pathControl);
  if (pathControl === 61 || pathControl === 61.1 || pathControl === 64) changeModes(machine, { pathControl });
  const distance = gCode(request, G.distance);
  return distance === 90 || distance === 91 ? changeModes(machine, { distance }) : null;
}

/** Item 20: the motion mode, then the motion. */
function perform(machine: Machine, request: Request, stated: number | null, code: MotionCode | null): Executed {
  const mode = stated === 80 ? stated : code;
  if (mode !== null) changeCut(machine, mode, machine.modes.feed);
  return code === null ? null : move(machine, request, code);
}

/** Item 21: M0, M1 and M60 stop; M2 and M30 end, with the nine effects of 3.6.1. */
function stop(machine: Machine, request: Request): Executed {
  const code = mCode(request, M.stopping);
  if (code === null) return null;
  const { at } = placeOfM(request, M.stopping);
  if (code === 2 || code === 30) {
    const feed = machine.modes.feedMode === 93 ? null : machine.modes.feed;
    changeModes(machine, { ...AFTER_END, feed });
    machine.steps.push({ kind: 'end', at, code, modes: machine.modes });
    machine.ended = true;
  } else machine.steps.push({ kind: 'stop', at, optional: code === 1, modes: machine.modes });
  return null;
}

const placeOfG = (request: Request, group: number) => ({ at: placeOf(request, findWord(request, isG(group))) });
const placeOfM = (request: Request, group: number) => ({ at: placeOf(request, findWord(request, isM(group))) });

function refuseWord(request: Request, letter: Letter, code: 'negativeFeed' | 'negativeSpeed' | 'negativeTool' | 'negativeDwell' | 'notAnInteger'): ReadError {
  const word: Word | null = findWord(request, (candidate) => candidate.letter === letter);
  return readError(code, placeOf(request, word), word === null ? '' : shown(word));
}
