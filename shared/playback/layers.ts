/**
 * For each crossing of the net a short list of falls: from depth `za` at travel `sa` to `zb` at `sb`. The depth at a
 * given travel is the least that any fall has come to, so no order is needed to read it.
 */
export interface Falls {
  readonly vertices: number;
  readonly layers: number;
  /** Four numbers each: sa, za, sb, zb; layer after layer of one crossing lie together. */
  readonly data: Float32Array;
  readonly count: Uint8Array;
}

export function makeFalls(vertices: number, layers: number): Falls {
  return { vertices, layers, data: new Float32Array(vertices * layers * 4), count: new Uint8Array(vertices) };
}

/** Adds a fall that comes after all others of this crossing; one that reaches no deeper is left out. */
export function addFall(falls: Falls, vertex: number, sa: number, za: number, sb: number, zb: number, least: number): void {
  const { data, layers, count } = falls;
  const base = vertex * layers * 4;
  let n = count[vertex] ?? 0;
  const deepest = n === 0 ? 0 : (data[base + n * 4 - 1] ?? 0);
  if (zb >= deepest - least) return;
  if (n === layers) {
    dropLeast(data, base, n);
    n--;
  }
  const at = base + n * 4;
  data[at] = sa;
  data[at + 1] = za;
  data[at + 2] = sb;
  data[at + 3] = zb;
  count[vertex] = n + 1;
}

/** Makes room by leaving out the fall that deepens the wood least; the wood then disappears one fall late there. */
function dropLeast(data: Float32Array, base: number, n: number): void {
  let least = Infinity;
  let which = 0;
  let above = 0;
  for (let i = 0; i < n; i++) {
    const low = data[base + i * 4 + 3] ?? 0;
    if (above - low < least) [least, which] = [above - low, i];
    above = low;
  }
  data.copyWithin(base + which * 4, base + (which + 1) * 4, base + n * 4);
}

/** Depth of one crossing at a travel: what the graphics card works out for every crossing in every frame. */
export function depthAt(falls: Falls, vertex: number, travel: number): number {
  const base = vertex * falls.layers * 4;
  let depth = 0;
  for (let i = 0; i < (falls.count[vertex] ?? 0); i++) {
    const [sa = 0, za = 0, sb = 0, zb = 0] = falls.data.subarray(base + i * 4, base + i * 4 + 4);
    if (travel < sa) continue;
    const share = sb > sa ? Math.min(1, (travel - sa) / (sb - sa)) : 1;
    depth = Math.min(depth, za + (zb - za) * share);
  }
  return depth;
}

/**
 * The falls as one picture, layer under layer, each as many rows high as the net: what a texture holds. Empty places
 * begin at a travel that never comes.
 */
export function packFalls(falls: Falls, columns: number, rows: number): { readonly data: Float32Array; readonly layers: number } {
  const layers = Math.max(1, falls.count.reduce((most, n) => Math.max(most, n), 0));
  const data = new Float32Array(columns * rows * layers * 4);
  for (let layer = 0; layer < layers; layer++) {
    for (let vertex = 0; vertex < falls.vertices; vertex++) {
      const to = (layer * falls.vertices + vertex) * 4;
      if (layer >= (falls.count[vertex] ?? 0)) {
        data[to] = NEVER;
        continue;
      }
      const from = (vertex * falls.layers + layer) * 4;
      data[to] = falls.data[from] ?? 0;
      data[to + 1] = falls.data[from + 1] ?? 0;
      data[to + 2] = falls.data[from + 2] ?? 0;
      data[to + 3] = falls.data[from + 3] ?? 0;
    }
  }
  return { data, layers };
}

/** Longer than any program: 100 000 blocks of the longest travel a rail can have. */
const NEVER = 1e30;
