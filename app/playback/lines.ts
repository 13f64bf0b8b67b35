import { Float32BufferAttribute, GreaterDepth, Group, InstancedBufferAttribute, InstancedBufferGeometry, LessEqualDepth, Mesh, ShaderMaterial } from 'three';
import type { Color, IUniform, Vector2, BufferGeometry } from 'three';
import type { Box, Segments } from '#shared/playback/index';
import { type PackedLines, packLines } from './packLines';
import { LINE_FRAGMENT, LINE_VERTEX } from './shaders';

/** What every line and outline needs to know of the canvas; one object, so that a resize sets it once. */
export interface Screen {
  readonly size: IUniform<Vector2>;
  /** Device pixels to one of the page's. */
  readonly pixels: IUniform<number>;
}

export interface LineLook {
  readonly colour: Color;
  readonly rapidColour?: Color;
  /** The page's pixels. */
  readonly width: number;
  readonly opacity?: number;
  /** Draws only what stands behind something else. */
  readonly hidden?: boolean;
  readonly travel: IUniform<number>;
  readonly order: number;
  /** Share of its distance that it is drawn nearer, to lie on what it lies on; edges more than the path inside the wood. */
  readonly lift?: number;
  /** Leaves out what the section takes away. */
  readonly section?: IUniform<boolean>;
  readonly middle?: number;
  /** The wood's depths, for a line whose height follows them. */
  readonly field?: Record<string, IUniform>;
}

/** One quad for each piece of line; every look at it shares them. */
export function lineGeometry({ count, from, to, travel, kind }: PackedLines): InstancedBufferGeometry {
  const geometry = new InstancedBufferGeometry();
  geometry.setAttribute('position', new Float32BufferAttribute([0, -0.5, 0, 1, -0.5, 0, 1, 0.5, 0, 0, 0.5, 0], 3));
  geometry.setIndex([0, 1, 2, 0, 2, 3]);
  geometry.setAttribute('aFrom', new InstancedBufferAttribute(from, 3));
  geometry.setAttribute('aTo', new InstancedBufferAttribute(to, 3));
  geometry.setAttribute('aTravel', new InstancedBufferAttribute(travel, 2));
  geometry.setAttribute('aRapid', new InstancedBufferAttribute(kind, 1));
  geometry.instanceCount = count;
  return geometry;
}

export function lineMesh(geometry: BufferGeometry, screen: Screen, look: LineLook): Mesh<BufferGeometry, ShaderMaterial> {
  const material = new ShaderMaterial({
    vertexShader: LINE_VERTEX,
    fragmentShader: LINE_FRAGMENT,
    transparent: true,
    depthWrite: false,
    depthFunc: look.hidden ? GreaterDepth : LessEqualDepth,
    uniforms: {
      uSize: screen.size,
      uPixels: screen.pixels,
      uWidth: { value: look.width },
      uColour: { value: look.colour },
      uRapidColour: { value: look.rapidColour ?? look.colour },
      uOpacity: { value: look.opacity ?? 1 },
      uTravel: look.travel,
      uLift: { value: look.lift ?? 0.001 },
      uSection: look.section ?? { value: false },
      uMiddle: { value: look.middle ?? 0 },
      ...look.field,
    },
    ...(look.field ? { defines: { PROFILE: '' } } : {}),
  });
  const mesh = new Mesh(geometry, material);
  mesh.frustumCulled = false;
  mesh.renderOrder = look.order;
  return mesh;
}

/** A straight line of any two places, as lines are kept. */
type Line = readonly [number, number, number, number, number, number];

/** The edges of a box from `y0` back: a section has those of the back half, and its own line along the front of the top. */
export function boxEdges({ x0, x1, y1, z0, z1 }: Box, y0: number, topFront = true): Line[] {
  const edges: Line[] = [];
  for (const y of [y0, y1]) for (const z of [z0, z1]) if (topFront || y !== y0 || z !== z1) edges.push([x0, y, z, x1, y, z]);
  for (const x of [x0, x1]) for (const z of [z0, z1]) edges.push([x, y0, z, x, y1, z]);
  for (const x of [x0, x1]) for (const y of [y0, y1]) edges.push([x, y, z0, x, y, z1]);
  return edges;
}

export function asSegments(lines: readonly Line[]): Segments {
  const travel = new Float64Array(lines.length * 2);
  lines.forEach(([ax, ay, az, bx, by, bz], i) => (travel[i * 2 + 1] = Math.hypot(bx - ax, by - ay, bz - az)));
  return { count: lines.length, ends: Float64Array.from(lines.flat()), travel, rapid: new Uint8Array(lines.length) };
}

/** The edge of the section: along the top, down into the cut and up again, as deep as it is at the moment. */
export function profileLine(line: readonly { readonly x: number; readonly crossing: number }[], y: number, z: number, screen: Screen, look: LineLook): Mesh {
  const pairs = line.slice(1).map((to, i) => [line[i] ?? to, to] as const);
  const geometry = lineGeometry(packLines(asSegments(pairs.map(([from, to]) => [from.x, y, z, to.x, y, z])), Infinity));
  geometry.setAttribute('aCrossings', new InstancedBufferAttribute(Float32Array.from(pairs.flatMap(([from, to]) => [from.crossing, to.crossing])), 2));
  return lineMesh(geometry, screen, look);
}

/** The path: over the wood in full, through it faintly; over a pale casing on dark woods. */
export function pathLines(lines: PackedLines, screen: Screen, colours: { crayon: Color; rapid: Color; casing: Color | null }, shared: Pick<LineLook, 'travel' | 'section' | 'middle'>): Group {
  const geometry = lineGeometry(lines);
  const group = new Group();
  const path = { ...shared, colour: colours.crayon, rapidColour: colours.rapid };
  if (colours.casing) group.add(lineMesh(geometry, screen, { ...shared, colour: colours.casing, width: 5.5, order: 10, opacity: 0.9 }));
  group.add(lineMesh(geometry, screen, { ...path, width: 1.6, opacity: 0.4, hidden: true, order: 9 }));
  group.add(lineMesh(geometry, screen, { ...path, width: 2.5, order: 11 }));
  return group;
}
