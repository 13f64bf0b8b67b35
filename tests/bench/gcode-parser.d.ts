// The package has no types of its own; these are what the tests use of it.
declare module 'gcode-parser' {
  export function parseStringSync(text: string): { readonly line: string; readonly words: [string, number][] }[];
}
