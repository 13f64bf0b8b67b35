/** A part on a board: how far along the strip it begins. */
export interface LaidPart {
  readonly name: string;
  readonly at: number;
  readonly length: number;
}

/** A strip ripped off a board: how far across it begins, and its parts. */
export interface LaidStrip {
  readonly at: number;
  readonly width: number;
  readonly parts: readonly LaidPart[];
}

/** How to saw one board: what a sawing diagram shows. Rip between strips first, then crosscut each. */
export interface BoardLayout {
  readonly strips: readonly LaidStrip[];
}

/** Strips side by side and parts end to end, a kerf between neighbours. */
export function layBoard(strips: readonly { readonly width: number; readonly parts: readonly { readonly name: string; readonly length: number }[] }[], kerf: number): BoardLayout {
  let across = 0;
  return {
    strips: strips.map(({ width, parts }) => {
      const at = across;
      across += width + kerf;
      let along = 0;
      return { at, width, parts: parts.map(({ name, length }) => {
        const start = along;
        along += length + kerf;
        return { name, at: start, length };
      }) };
    }),
  };
}
