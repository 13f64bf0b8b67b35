import type { Place, ReadError } from './motion';

/**
 * Every reason the reader has for refusing a text, in the order of its work.
 * Numbers in brackets are sections of NISTIR 6556; "ours" marks a rule the report does not state.
 */
export const READ_ERRORS = [
  // Characters and words (3.3, Appendix E)
  'lineTooLong', //         over 256 characters (3.3)
  'character', //           a character no line may hold outside a comment (3.3)
  'letter', //              E, O, U, V or W: no word starts with it (Table 3)
  'slashPlace', //          a slash not at the start of its line (3.3)
  'percentPlace', //        a percent line with no percent line opening the file (Appendix A.1, item 4)
  'percentAlone', //        a percent sign with anything else on its line (3.1)
  'percentNotClosed', //    a percent line at the beginning and none at the end (3.1)
  'lineNumberPlace', //     an N word elsewhere than first (3.3, E.2)
  'lineNumberForm', //      an N word that is not one to five digits (3.3.1)
  'commentNotClosed', //    a comment without its closing parenthesis on the line (3.3.4)
  'nestedComment', //       a parenthesis opened inside a comment (3.3.4)
  'commentCharacter', //    a control character inside a comment (E)
  'missingNumber', //       a letter without a number (3.3.2.1)
  'numberForm', //          a number with two decimal points (3.3.2.1)
  'parameterNotRead', //    #: ours, not read
  'expressionNotRead', //   [ ]: ours, not read
  'functionNotRead', //     a unary function: ours, not read
  // The words of one line (3.3.5, 3.4)
  'repeatedLetter', //      a letter twice on a line (3.3.5)
  'notAnInteger', //        a code or index farther than 0.0001 from an integer (3.3.2.1)
  'unknownCode', //         a G or M code outside Tables 5 and 7
  'modalGroup', //          two codes of one modal group on a line (3.3.5)
  'tooManyM', //            more than four M words on a line (3.3.5)
  'axisConflict', //        two codes on a line that both use the axis words (3.4)
  'codeNotRead', //         a G code the report knows and this reader does not run: ours
  'rotaryAxis', //          A, B or C: ours, not read
  'unusedWord', //          a word no code on its line uses (3.3: what is not allowed is illegal)
  'negativeFeed', //        ours: the report gives a negative F no meaning
  'negativeSpeed', //       (3.7.2)
  'negativeTool', //        (3.7.3)
  'negativeDwell', //       (3.5.4)
  'missingDwell', //        G4 without P (3.5, required items; 3.5.4)
  // Motion (3.5)
  'noMotionMode', //        axis words before any motion code: ours, the report leaves the first mode to the machine
  'axisWordsMissing', //    G0, G1, G2 or G3 without an axis word (3.5.1, 3.5.2)
  'axisWordsForbidden', //  axis words while G80 is active (3.5.15)
  'inverseTimeFeed', //     a cutting motion under G93 without its own F (3.5.19)
  'unitsChange', //         other units after the first motion: ours, one program, one unit
  'offsetChange', //        another work offset after the first motion: ours, the offsets are not in the text
  'unknownStart', //        an increment or an arc from a position the program has not stated: ours
  'arcEndMissing', //       no axis word in the arc's plane (3.5.3.1, 3.5.3.2)
  'arcCentreMissing', //    neither a centre nor a radius (3.5.3.2)
  'arcFormats', //          a centre and a radius (3.5.3: one format or the other)
  'arcRadiiDiffer', //      start and end not equally far from the centre (3.5.3.2)
  'arcNoRadius', //         an arc of radius zero: ours, it has no direction
  'arcEndIsStart', //       radius format, end = start (3.5.3.1)
  'arcOutOfReach', //       radius format, end farther away than the diameter: ours, no such circle
  'arcNearlyFull', //       radius format, over 359.999 degrees (3.5.3.1)
  // The whole program
  'noEnd', //               no M2, M30 or percent pair (3.1)
] as const;
export type ReadErrorCode = (typeof READ_ERRORS)[number];

/** One sentence per code; `saw` is the word or character at the place of the error. */
const REASONS: Readonly<Record<ReadErrorCode, (saw: string) => string>> = {
  lineTooLong: () => 'This line is longer than the 256 characters a line may have.',
  character: (saw) => `${saw} is not allowed here; a line holds words such as G1 or X2.5, and comments in parentheses.`,
  letter: (saw) => `No word starts with ${saw}; words start with A, B, C, D, F, G, H, I, J, K, L, M, N, P, Q, R, S, T, X, Y or Z.`,
  slashPlace: () => 'A slash is allowed only as the first character of a line.',
  percentPlace: () => 'A percent line is allowed here only if the first line of the file is one too.',
  percentAlone: () => 'A percent sign must be alone on its line.',
  percentNotClosed: () => 'The file opens with a percent line and needs a second one at its end.',
  lineNumberPlace: () => 'A line number is allowed only once, at the start of its line or right after the slash.',
  lineNumberForm: () => 'A line number is N and one to five digits, without sign or point.',
  commentNotClosed: () => 'This comment must be closed with ) on the same line.',
  nestedComment: () => 'A comment may not hold a second (; close the first one before it.',
  commentCharacter: (saw) => `${saw} is not allowed in a comment; printable characters, spaces and tabs are.`,
  missingNumber: (saw) => `${saw} needs a number after it, such as 5, .5 or -0.25.`,
  numberForm: () => 'A number may have one decimal point.',
  parameterNotRead: () => 'Parameters (#) are not read here; write the number itself.',
  expressionNotRead: () => 'Expressions in brackets are not read here; write the number itself.',
  functionNotRead: (saw) => `The function ${saw} is not read here; write the number itself.`,
  repeatedLetter: (saw) => `${saw} is a second word with the same letter; a line may have one.`,
  notAnInteger: (saw) => `${saw} does not name a code or a tool; it must be within 0.0001 of a whole number, or of a tenth for G.`,
  unknownCode: (saw) => `${saw} is not a code of this language.`,
  modalGroup: (saw) => `${saw} is a second code of the same modal group; a line may have one.`,
  tooManyM: (saw) => `${saw} is a fifth M word; a line may have four.`,
  axisConflict: (saw) => `${saw} and the motion code on this line both claim the axis words; put them on two lines.`,
  codeNotRead: (saw) => `${saw} is not read here.`,
  rotaryAxis: (saw) => `${saw} turns a rotary axis; only X, Y and Z are read here.`,
  unusedWord: (saw) => `Nothing on this line uses ${saw}; P goes with G4, and R, or I, J and K in the arc's plane, go with G2 and G3.`,
  negativeFeed: (saw) => `The feed ${saw} is negative; it must be zero or more.`,
  negativeSpeed: (saw) => `The spindle speed ${saw} is negative; it must be zero or more.`,
  negativeTool: (saw) => `The tool ${saw} is negative; it must be zero or more.`,
  negativeDwell: (saw) => `The dwell ${saw} is negative; it must be zero or more.`,
  missingDwell: () => 'G4 needs a P word with the time to wait.',
  noMotionMode: (saw) => `${saw} has no motion to belong to; state G0, G1, G2 or G3 first.`,
  axisWordsMissing: (saw) => `${saw} needs at least one of X, Y and Z on its line.`,
  axisWordsForbidden: (saw) => `${saw} asks for motion while G80 is in force; state G0, G1, G2 or G3 first.`,
  inverseTimeFeed: () => 'Under G93 every line that cuts needs its own F word.',
  unitsChange: (saw) => `${saw} changes the units after the first motion; one program is read in one unit.`,
  offsetChange: (saw) => `${saw} changes the work offset after the first motion; one program is read in one coordinate system.`,
  unknownStart: (saw) => `${saw} starts from a position the program has not stated; move there with G90 first.`,
  arcEndMissing: () => 'An arc needs its end: at least one axis word in the selected plane.',
  arcCentreMissing: () => 'An arc needs its centre (I, J or K in the selected plane) or its radius (R).',
  arcFormats: () => 'An arc is given by its centre or by its radius, not by both.',
  arcRadiiDiffer: () => "The arc's start and end must be equally far from its centre, within 0.0002 inch or 0.002 millimetre.",
  arcNoRadius: () => 'An arc must have a radius greater than zero.',
  arcEndIsStart: () => 'An arc given by its radius must end elsewhere than it starts.',
  arcOutOfReach: () => "The arc's end is farther from its start than twice the radius.",
  arcNearlyFull: () => 'An arc given by its radius may turn through 359.999 degrees at most.',
  noEnd: () => 'The program needs an M2 or an M30, or a percent line at its beginning and at its end.',
};

/** The one maker of errors; `saw` names the word or character at `at` where the sentence needs it. */
export function readError(code: ReadErrorCode, at: Place, saw = ''): ReadError {
  return { code, at, reason: REASONS[code](saw) };
}
