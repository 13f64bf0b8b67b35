// The judge of generated programs. It shares nothing with shared/: written from the issue and NISTIR 6556 alone.
export { expectSoundCut, judgeCut } from './judge';
export { cutLength, cutLengthBound, type CutLengthBound } from './cutLength';
// The text rules one by one, for the tests of single dialect hazards.
export { lintText } from './lint';
export * as wordLint from './lintWords';
export * as programLint from './lintProgram';
export { readText, type ProgramText } from './words';
export { RULES, type JudgedOptions, type JudgedSpec, type Rule, type Violation } from './types';
