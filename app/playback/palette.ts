import { Color, SRGBColorSpace } from 'three';

/** Colours as the style sheet has them at this moment; kept as written, because the shaders mix them as a drawing does. */
const TOKENS = {
  ground: ['--ground-hi', '#e6eaec'],
  ink: ['--ink', '#111e2b'],
  rule: ['--rule', '#74828d'],
  crayon: ['--crayon-on-wood', '#c8341b'],
  rapid: ['--crayon', '#c8341b'],
  casing: ['--case', ''],
  tape: ['--tape', '#1b5fa8'],
  sheet: ['--sheet', '#ffffff'],
  steel: ['--steel', '#9aa6ae'],
  steelHi: ['--steel-hi', '#c9d1d6'],
  steelLo: ['--steel-lo', '#66747e'],
  wood: ['--wd', '#dcc7a0'],
  woodHi: ['--wd-hi', '#e9dab9'],
  woodLo: ['--wd-lo', '#bfa478'],
  woodGrain: ['--wd-grain', '#a98b5a'],
  woodDeep: ['--wd-deep', '#84693f'],
} as const satisfies Record<string, readonly [string, string]>;

type Name = Exclude<keyof typeof TOKENS, 'casing'>;
export type Palette = Readonly<Record<Name, Color>> & { readonly casing: Color | null };

/** Reads the tokens that hold at `element`, which carries the species. */
export function readPalette(element: Element): Palette {
  const style = getComputedStyle(element);
  const read = ([token, otherwise]: readonly [string, string]) => style.getPropertyValue(token).trim() || otherwise;
  const colour = (name: Name) => raw(read(TOKENS[name]));
  const casing = read(TOKENS.casing);
  return {
    ground: colour('ground'), ink: colour('ink'), rule: colour('rule'), crayon: colour('crayon'), rapid: colour('rapid'), tape: colour('tape'), sheet: colour('sheet'),
    steel: colour('steel'), steelHi: colour('steelHi'), steelLo: colour('steelLo'),
    wood: colour('wood'), woodHi: colour('woodHi'), woodLo: colour('woodLo'), woodGrain: colour('woodGrain'), woodDeep: colour('woodDeep'),
    casing: casing ? raw(casing) : null,
  };
}

/** A colour whose three numbers are those of the style sheet, not turned into linear light. */
function raw(text: string): Color {
  const colour = new Color(text);
  return colour.copyLinearToSRGB(colour);
}

/** The clear colour goes through the library's own conversion, so it gets the colour as the library reads it. */
export const cssOf = (colour: Color): string => `#${colour.clone().convertSRGBToLinear().getHexString(SRGBColorSpace)}`;
