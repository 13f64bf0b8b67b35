import { BufferGeometry, Float32BufferAttribute, GreaterDepth, Group, InstancedBufferAttribute, InstancedBufferGeometry, LessEqualDepth, Mesh, ShaderMaterial } from 'three';
import type { Color, IUniform, Vector2 } from 'three';
import type { Box, Segments } from '#shared/playback/index';
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
}

/** One quad for each piece of line; the pieces come from the segments without a copy per look. */
export function lineGeometry({ count, ends, travel, rapid }: Segments): InstancedBufferGeometry {
  const geometry = new InstancedBufferGeometry();
  geometry.setAttribute('position', new Float32BufferAttribute([0, -0.5, 0, 1, -0.5, 0, 1, 0.5, 0, 0, 0.5, 0], 3));
  geometry.setIndex([0, 1, 2, 0, 2, 3]);
  const pick = (of: Float64Array, size: number, from: number, each: number) => {
    const picked = new Float32Array(count * size);
    for (let i = 0; i < count; i++) for (let k = 0; k < size; k++) picked[i * size + k] = of[i * each + from + k] ?? 0;
    return new InstancedBufferAttribute(picked, size);
  };
  geometry.setAttribute('aFrom', pick(ends, 3, 0, 6));
  geometry.setAttribute('aTo', pick(ends, 3, 3, 6));
  geometry.setAttribute('aTravel', pick(travel, 2, 0, 2));
  geometry.setAttribute('aRapid', new InstancedBufferAttribute(Float32Array.from(rapid), 1));
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
    },
  });
  const mesh = new Mesh(geometry, material);
  mesh.frustumCulled = false;
  mesh.renderOrder = look.order;
  return mesh;
}

/** A straight line of any two places, as lines are kept. */
type Line = readonly [number, number, number, number, number, number];

/** The twelve edges of a box; `from` its front, so that a section can have those of its back half alone. */
export function boxEdges({ x0, x1, y1, z0, z1 }: Box, y0: number): Line[] {
  const edges: Line[] = [];
  for (const y of [y0, y1]) for (const z of [z0, z1]) edges.push([x0, y, z, x1, y, z]);
  for (const x of [x0, x1]) for (const z of [z0, z1]) edges.push([x, y0, z, x, y1, z]);
  for (const x of [x0, x1]) for (const y of [y0, y1]) edges.push([x, y, z0, x, y, z1]);
  return edges;
}

export function asSegments(lines: readonly Line[]): Segments {
  const travel = new Float64Array(lines.length * 2);
  lines.forEach(([ax, ay, az, bx, by, bz], i) => (travel[i * 2 + 1] = Math.hypot(bx - ax, by - ay, bz - az)));
  return { count: lines.length, ends: Float64Array.from(lines.flat()), travel, rapid: new Uint8Array(lines.length) };
}

/** The path: over the wood in full, through it faintly; over a pale casing on dark woods. */
export function pathLines(segments: Segments, screen: Screen, travel: IUniform<number>, look: { crayon: Color; rapid: Color; casing: Color | null }): Group {
  const geometry = lineGeometry(segments);
  const group = new Group();
  if (look.casing) group.add(lineMesh(geometry, screen, { colour: look.casing, width: 5.5, travel, order: 10, opacity: 0.9 }));
  group.add(lineMesh(geometry, screen, { colour: look.crayon, rapidColour: look.rapid, width: 1.6, opacity: 0.4, hidden: true, travel, order: 9 }));
  group.add(lineMesh(geometry, screen, { colour: look.crayon, rapidColour: look.rapid, width: 2.5, travel, order: 11 }));
  return group;
}
