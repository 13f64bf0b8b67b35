import * as programRules from './lintProgram';
import * as wordRules from './lintWords';
import type { JudgedOptions, JudgedSpec, Violation } from './types';
import type { ProgramText } from './words';

/** Every check that needs only the text. */
export function lintText(program: ProgramText, options: JudgedOptions = {}, spec?: Pick<JudgedSpec, 'units' | 'spindle'>): Violation[] {
  return [
    ...programRules.lineLength(program),
    ...programRules.lineEnding(program, options.lineEndings),
    ...programRules.percent(program, options.percent ?? true),
    ...programRules.comment(program),
    ...programRules.date(program),
    ...programRules.mark(program, options.comments),
    ...programRules.lineNumber(program, options.lineNumbers),
    ...programRules.modes(program),
    ...programRules.units(program, options.programUnits ?? spec?.units),
    ...programRules.dwell(program, spec?.spindle === 'hand' ? 'none' : options.spindleWait), // by hand, the person waits
    ...programRules.end(program, options.end ?? 'M30'),
    ...programRules.parser(program),
    ...programRules.rapidWords(program),
    ...wordRules.letters(program),
    ...wordRules.codes(program),
    ...wordRules.numberForm(program),
    ...wordRules.decimalPoint(program),
    ...wordRules.decimals(program),
    ...wordRules.negativeZero(program),
    ...wordRules.repeat(program),
    ...wordRules.modalGroup(program),
    ...wordRules.mWords(program),
    ...wordRules.mWithMotion(program),
    ...wordRules.wordOrder(program),
    ...wordRules.arcWords(program),
  ];
}
