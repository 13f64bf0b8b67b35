// The reader: RS-274/NGC text to motions, by NISTIR 6556. Knows nothing of what we write.

export { readProgram } from './program'; // text → program, or the first error
export { readBlocks, type BlocksResult } from './words'; // text → words with their places
export { arcLength } from './arc'; // length along an arc or helix
export { READ_ERRORS, type ReadErrorCode } from './errors'; // every reason for a refusal
export type {
  ArcPath, // the circle an arc follows
  Block, // one line's words
  Comment, // one comment
  Event, // what happens besides motion
  Modes, // the modal state of a step
  Motion, // one motion of the controlled point
  Place, // line and column
  ReadError, // code, place, sentence
  ReadOptions, // what a dialect leaves open
  ReadProgram, // the program as read
  ReadResult, // program or error
  Step, // a motion or an event
  Word, // a letter and its number
} from './motion';
