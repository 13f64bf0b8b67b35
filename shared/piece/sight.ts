/** Where the eye is: above the rail's top (below zero: under it) and out from the board's face. */
export interface Eye {
  readonly above: number;
  readonly out: number;
}

/** A coin's front face in section: foot and top as distance out from the board and height above the rail's top. */
export interface Face {
  readonly foot: { readonly out: number; readonly up: number };
  readonly top: { readonly out: number; readonly up: number };
}

/**
 * Share of a face's height that the eye sees past an edge above it (the underside of the next rail's front) and past
 * the rail's own front lip. A point is seen where the sight line to it passes under the one and over the other. Along
 * the face both limits are crossings of two lines, so what is seen is one stretch.
 */
export function shareSeen(face: Face, eye: Eye, edgeAbove: { readonly out: number; readonly up: number } | null, lip: { readonly out: number; readonly up: number }): number {
  /** Where along the face (0 foot, 1 top) the line from the eye over an edge meets it. */
  const crossing = (edge: { readonly out: number; readonly up: number }) => {
    const [dx, dy] = [edge.out - eye.out, edge.up - eye.above];
    const [fx, fy] = [face.top.out - face.foot.out, face.top.up - face.foot.up];
    return ((eye.above - face.foot.up) * dx - (eye.out - face.foot.out) * dy) / (fy * dx - fx * dy);
  };
  const from = Math.max(0, crossing(lip));
  const to = edgeAbove ? Math.min(1, crossing(edgeAbove)) : 1;
  return Math.max(0, to - from);
}
