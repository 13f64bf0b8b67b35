/** The package carries no types; these are the parts used here, from its README (gcode-parser 2.2.0). */
declare module 'gcode-parser' {
  export interface ParsedLine {
    readonly line: string;
    /** A value that is no number stays a string. The N word is in `ln`, not here. */
    readonly words: readonly (readonly [string, number | string])[];
    readonly ln?: number;
    readonly comments?: readonly string[];
    readonly cmds?: readonly string[];
  }
  export function parseStringSync(text: string): ParsedLine[];
}
