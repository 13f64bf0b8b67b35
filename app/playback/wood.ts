import { BufferAttribute, BufferGeometry, DataTexture, DoubleSide, Float32BufferAttribute, FloatType, Group, Mesh, NearestFilter, RGBAFormat, ShaderMaterial } from 'three';
import type { IUniform, Texture } from 'three';
import type { Box } from '#shared/playback/index';
import type { Palette } from './palette';
import { WOOD_FRAGMENT, WOOD_VERTEX } from './shaders';
import type { CutField } from './workOut';

/** What the wood's parts share; one object each, so that a frame sets each once. */
export interface WoodUniforms {
  readonly travel: IUniform<number>;
  readonly section: IUniform<boolean>;
  readonly long: Texture;
  readonly end: Texture;
}

/** The rail: a block whose top is left open where the cut is, the net that fills it, and the face a section shows. */
export function woodGroup(rail: Box, cut: CutField | null, field: Record<string, IUniform>, palette: Palette, shared: WoodUniforms): Group {
  const group = new Group();
  const wide = rail.y1 - rail.y0;
  const middle = middleOf(rail, cut);
  const uniforms = {
    uWood: { value: palette.wood }, uHi: { value: palette.woodHi }, uLo: { value: palette.woodLo }, uGrain: { value: palette.woodGrain }, uDeep: { value: palette.woodDeep },
    uLong: { value: shared.long }, uEnd: { value: shared.end },
    uWide: { value: wide }, uSlight: { value: wide * 1e-4 }, uMiddle: { value: middle }, uSection: shared.section, uTravel: shared.travel,
  };
  const add = (geometry: BufferGeometry, defines: Record<string, string>) => {
    const material = new ShaderMaterial({ vertexShader: WOOD_VERTEX, fragmentShader: WOOD_FRAGMENT, uniforms: { ...uniforms, ...field }, defines, side: DoubleSide });
    const mesh = new Mesh(geometry, material);
    mesh.frustumCulled = false;
    group.add(mesh);
    return mesh;
  };
  add(blockGeometry(rail, cut), {});
  if (cut) add(fieldGeometry(cut), { FIELD: '' });
  const cap = add(capGeometry(rail, cut, middle), { CAP: '' });
  cap.name = 'cap';
  cap.visible = shared.section.value;
  return group;
}

/** The falls as the shaders read them: a texture, and how it is laid out. Empty where nothing is cut. */
export function fieldUniforms(cut: CutField | null): Record<string, IUniform> {
  if (!cut) return {};
  const { grid, falls: { data, layers } } = cut;
  const texture = new DataTexture(data, grid.columns, grid.rows * layers, RGBAFormat, FloatType);
  texture.minFilter = texture.magFilter = NearestFilter;
  texture.needsUpdate = true;
  return { uFalls: { value: texture }, uColumns: { value: grid.columns }, uRows: { value: grid.rows }, uLayers: { value: layers } };
}

/** Where the section is cut: along the middle of what is cut away, or of the rail. */
export function middleOf(rail: Box, cut: CutField | null): number {
  return cut ? middleRow(cut).y : (rail.y0 + rail.y1) / 2;
}

/** The places along the section where the wood's height may change; a crossing of -1 stays at the top. */
export function middleLine(rail: Box, cut: CutField | null): { readonly x: number; readonly crossing: number }[] {
  const line = [{ x: rail.x0, crossing: -1 }];
  if (cut) {
    const { row } = middleRow(cut);
    for (let c = 0; c < cut.grid.columns; c++) {
      const crossing = row * cut.grid.columns + c;
      line.push({ x: cut.position[crossing * 3] ?? 0, crossing });
    }
  }
  line.push({ x: rail.x1, crossing: -1 });
  return line;
}

/** The row of crossings along the middle of the cut. */
function middleRow({ grid }: CutField): { readonly row: number; readonly y: number } {
  const row = (grid.rows - 1) / 2;
  return { row, y: grid.ys[row] ?? 0 };
}

type Corner = readonly [number, number, number];

function quads(faces: readonly (readonly [Corner, Corner, Corner, Corner])[]): BufferGeometry {
  const geometry = new BufferGeometry();
  geometry.setAttribute('position', new Float32BufferAttribute(faces.flat(2), 3));
  geometry.setIndex(faces.flatMap((_, i) => [0, 1, 2, 0, 2, 3].map((k) => i * 4 + k)));
  return geometry;
}

/** Sides, ends and underside, and the top as a frame round the net. */
function blockGeometry({ x0, x1, y0, y1, z0, z1 }: Box, cut: CutField | null): BufferGeometry {
  const flat = (a: number, b: number, c: number, d: number) => [[a, c, z1], [b, c, z1], [b, d, z1], [a, d, z1]] as const;
  const upright = (ax: number, ay: number, bx: number, by: number) => [[ax, ay, z0], [bx, by, z0], [bx, by, z1], [ax, ay, z1]] as const;
  const faces: (readonly [Corner, Corner, Corner, Corner])[] = [
    upright(x0, y0, x1, y0), upright(x1, y0, x1, y1), upright(x1, y1, x0, y1), upright(x0, y1, x0, y0),
    [[x0, y0, z0], [x1, y0, z0], [x1, y1, z0], [x0, y1, z0]],
  ];
  if (!cut) return quads([...faces, flat(x0, x1, y0, y1)]);
  const { xs, ys, columns, rows } = cut.grid;
  const [a = x0, b = x1, c = y0, d = y1] = [xs[0], xs[columns - 1], ys[0], ys[rows - 1]];
  return quads([...faces, flat(x0, a, y0, y1), flat(b, x1, y0, y1), flat(a, b, y0, c), flat(a, b, d, y1)]);
}

/** The net; its heights come from the texture. */
function fieldGeometry({ position, index }: CutField): BufferGeometry {
  const geometry = new BufferGeometry();
  geometry.setAttribute('position', new BufferAttribute(position, 3));
  geometry.setIndex(new BufferAttribute(index, 1));
  return geometry;
}

/** The face along the middle of the cut: as high as the wood is at each crossing of the middle row. */
function capGeometry(rail: Box, cut: CutField | null, y: number): BufferGeometry {
  const { z0, z1 } = rail;
  const tops = middleLine(rail, cut);
  const position = tops.flatMap(({ x }) => [x, y, z1, x, y, z0]);
  const crossings = tops.flatMap(({ crossing }) => [crossing, -1]);
  const index = tops.slice(1).flatMap((_, i) => [0, 1, 3, 0, 3, 2].map((k) => i * 2 + k));
  const geometry = new BufferGeometry();
  geometry.setAttribute('position', new Float32BufferAttribute(position, 3));
  geometry.setAttribute('aCrossing', new Float32BufferAttribute(crossings, 1));
  geometry.setIndex(index);
  return geometry;
}
