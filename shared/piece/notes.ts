import type { PieceKind } from './kinds';

/** Something customers ask about, with where it stands. A note and no law: it carries no penalty for a wall piece. */
export interface Note {
  readonly words: string;
  readonly source: string;
}

const FLAG: readonly Note[] = [
  { words: 'Hung on a wall, the union is uppermost and to the observer\'s left.', source: '4 U.S.C. 7(i)' },
  { words: 'The flag carries no mark, insignia, letter, word or design of any kind.', source: '4 U.S.C. 8(g)' },
  { words: 'The flag is no receptacle for receiving, holding, carrying or delivering anything.', source: '4 U.S.C. 8(h)' },
  { words: 'These sections advise on the flag itself. A striped board is a likeness of it, and whether they reach it is for the customer to judge.', source: '4 U.S.C. 7 and 8' },
];

/** Notes that a kind of piece brings with it. */
export const notesFor = (kind: PieceKind): readonly Note[] => (kind === 'striped-flag' ? FLAG : []);
