import type { LengthUnits, Rule, Violation } from './types';
import { blocksOf, motionCode, namesAxis, type ProgramText, type TextLine, type Word } from './words';

/** A lint rule looks at the text alone. */
export type Lint = (program: ProgramText) => Violation[];

/** Words the issue allows ("The text"); N and P only by option. */
const LETTERS = 'NGXYZIJPFSM';
const G_CODES = [0, 1, 2, 3, 4, 17, 20, 21, 40, 49, 54, 80, 90, 94];
const M_CODES = [0, 2, 3, 5, 30];
/** FACTS A9, "address letters" (ISO 6983 order); P, of G4 alone, stands with the other parameters. */
const ORDER = 'NGXYZIJPFSTM';
/** NISTIR 6556 Table 4. G4 is non-modal, group 0. */
const G_GROUP = new Map([[0, 1], [1, 1], [2, 1], [3, 1], [80, 1], [17, 2], [90, 3], [94, 5], [20, 6], [21, 6], [40, 7], [49, 8], [54, 12], [4, 0]]);
/** NISTIR 6556 3.3.2.1 allows more; FACTS A9 keeps to a digit before and after the point and no plus sign. */
const PLAIN_NUMBER = /^-?\d+(\.\d+)?$/;
const POINTED = 'XYZIJF';

function eachWord(rule: Rule, fault: (word: Word, block: TextLine) => string | null): Lint {
  return program => blocksOf(program).flatMap(block => block.words.flatMap((word) => {
    const message = fault(word, block);
    return message === null ? [] : [{ rule, line: block.line, message: `${word.letter}${word.text}: ${message}` }];
  }));
}

function eachBlock(rule: Rule, fault: (block: TextLine) => string | null): Lint {
  return program => blocksOf(program).flatMap((block) => {
    const message = fault(block);
    return message === null ? [] : [{ rule, line: block.line, message: `${block.text}: ${message}` }];
  });
}

/** The units the text states first, or null. */
export function statedUnits(program: ProgramText): LengthUnits | null {
  for (const block of blocksOf(program)) {
    for (const word of block.words) {
      if (word.letter === 'G' && word.value === 20) return 'in';
      if (word.letter === 'G' && word.value === 21) return 'mm';
    }
  }
  return null;
}

/** Issue, "The text": only these letters, upper case; anything else on a line is an error (NISTIR 6556 3.3). */
export const letters: Lint = program => program.lines.flatMap((line): Violation[] => {
  const wrong = line.words.filter(word => !LETTERS.includes(word.letter)).map(word => word.letter + word.text);
  if (line.rest !== '' && line.text !== '%') wrong.push(line.rest);
  return wrong.map(message => ({ rule: 'letters', line: line.line, message: `not in the subset: ${message}` }));
});

/** Issue, "The text": the G and M codes any three-axis controller takes. */
export const codes = eachWord('codes', (word) => {
  if (word.letter === 'G' && !G_CODES.includes(word.value)) return 'not in the subset';
  return word.letter === 'M' && !M_CODES.includes(word.value) ? 'not in the subset' : null;
});

/** Issue: never an exponent; FACTS A9: X0.5, not X.5. */
export const numberForm = eachWord('number-form', word => PLAIN_NUMBER.test(word.text) ? null : 'not a plain decimal number');

/** FACTS A9: without a point some controllers count least increments. */
export const decimalPoint = eachWord('decimal-point', word =>
  POINTED.includes(word.letter) && !word.text.includes('.') ? 'no decimal point' : null);

/** Issue: 4 decimals in inches, 3 in mm, more only where an arc needs it (6 at most, our own limit). */
export const decimals: Lint = (program) => {
  const fixed = statedUnits(program) === 'mm' ? 3 : 4;
  let motion: number | undefined;
  return blocksOf(program).flatMap((block) => {
    motion = motionCode(block) ?? motion;
    const arc = motion === 2 || motion === 3;
    return block.words.filter(word => POINTED.includes(word.letter) && word.text.includes('.')).flatMap((word): Violation[] => {
      const written = word.text.length - word.text.indexOf('.') - 1;
      const least = word.letter === 'F' ? 1 : fixed;
      const most = arc && word.letter !== 'F' ? 6 : fixed;
      if (written >= least && written <= most) return [];
      return [{ rule: 'decimals', line: block.line, message: `${word.letter}${word.text} has ${written} decimals, not ${least} to ${most}` }];
    });
  });
};

/** Issue: never "-0". */
export const negativeZero = eachWord('negative-zero', word => /^-0*\.?0*$/.test(word.text) ? 'a minus sign before zero' : null);

/** NISTIR 6556 3.3.5: any letter but G and M once. */
export const repeat = eachBlock('repeat', (block) => {
  const plain = block.words.map(word => word.letter).filter(letter => letter !== 'G' && letter !== 'M');
  return new Set(plain).size === plain.length ? null : 'a letter stands twice';
});

/** NISTIR 6556 3.3.5: one G word of each modal group. */
export const modalGroup = eachBlock('modal-group', (block) => {
  const groups = block.words.filter(word => word.letter === 'G').map(word => G_GROUP.get(word.value));
  return new Set(groups).size === groups.length ? null : 'two words of one modal group';
});

/** FACTS A9: NISTIR 6556 allows four, others often one. */
export const mWords = eachBlock('m-words', block =>
  block.words.filter(word => word.letter === 'M').length > 1 ? 'more than one M word' : null);

/** NISTIR 6556 Table 8: M5 in a block with a move stops the spindle before the move. So no M word beside an axis word. */
export const mWithMotion = eachBlock('m-with-motion', block =>
  namesAxis(block) && block.words.some(word => word.letter === 'M') ? 'an M word beside a move' : null);

/** FACTS A9, "address letters". */
export const wordOrder = eachBlock('word-order', (block) => {
  const places = block.words.map(word => ORDER.indexOf(word.letter));
  return places.every((place, at) => at === 0 || place >= (places[at - 1] ?? 0)) ? null : `not in the order ${ORDER}`;
});

/** NISTIR 6556 3.5.3: error without I or J, or without X or Y. FACTS A9: all four always; Z only to climb or sink. */
export const arcWords: Lint = (program) => {
  let motion: number | undefined;
  return blocksOf(program).flatMap((block): Violation[] => {
    motion = motionCode(block) ?? motion;
    const named = block.words.map(word => word.letter);
    const arc = motion === 2 || motion === 3;
    const all = ['X', 'Y', 'I', 'J'].every(letter => named.includes(letter));
    if (arc && !all && (namesAxis(block) || named.includes('I') || named.includes('J') || motionCode(block) === motion)) {
      return [{ rule: 'arc-words', line: block.line, message: `${block.text}: an arc without X, Y, I and J` }];
    }
    if (!arc && (named.includes('I') || named.includes('J'))) {
      return [{ rule: 'arc-words', line: block.line, message: `${block.text}: I or J without an arc` }];
    }
    return [];
  });
};
