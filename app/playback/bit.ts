import { BackSide, BufferGeometry, CylinderGeometry, Float32BufferAttribute, Group, Mesh, ShaderMaterial } from 'three';
import type { Color } from 'three';
import type { StageSizes } from '#shared/playback/index';
import type { SlotSpec } from '#shared/slot/spec';
import type { Screen } from './lines';
import type { Palette } from './palette';
import { STEEL_FRAGMENT, STEEL_VERTEX } from './shaders';

/** Lead of a spiral flute: one turn in this many diameters stands at about 30°, as router bits are ground. */
const LEAD = 5.4;
/** Depth of a flute, share of the radius. */
const GULLET = 0.36;
/** Share of the turn that a land takes. */
const LAND = 0.42;
const AROUND = 60;
const UP = 48;

/** The bit in its nut and spindle, its end at the group's origin, Z along its axis. `turning` spins; the nut is drawn still, because its six sides would flicker. */
export function bitGroup(sizes: StageSizes, spec: Pick<SlotSpec, 'flutes' | 'bitKind'>, palette: Palette, screen: Screen): { readonly group: Group; readonly turning: Group; readonly holder: Group } {
  const group = new Group();
  const turning = new Group();
  const holder = new Group();
  group.add(turning, holder);
  const radius = sizes.bitDiameter / 2;
  const nut = sizes.colletDiameter / 2;
  const ink = [palette.ink, palette.ink, palette.ink] as const;
  const tones = { steel: [palette.steel, palette.steelHi, palette.steelLo], shank: [palette.steelHi, palette.steelHi, palette.steel], nut: [palette.steelLo, palette.steel, palette.steelLo] } as const;
  const add = (to: Group, geometry: BufferGeometry, tone: Tones, land = 0) => {
    to.add(solid(geometry, tone, screen, 0, land));
    to.add(solid(geometry, ink, screen, 1.5));
  };
  add(turning, flutesGeometry(radius, sizes.cuttingLength, spec.flutes, spec.bitKind), tones.shank, radius * 0.97);
  add(turning, upright(radius, radius, sizes.cuttingLength, sizes.stickout, 40), tones.shank);
  // The nut: a cone, a six-sided body, and the spindle's nose above it.
  const top = sizes.stickout;
  add(holder, upright(nut * 0.6, nut * 0.94, top, top + nut * 0.35, 40), tones.nut);
  const body = () => upright(nut, nut, top + nut * 0.35, top + nut * 1.25, 6);
  holder.add(solid(faceted(body()), tones.nut, screen, 0));
  holder.add(solid(body(), ink, screen, 1.5)); // the outline needs the round normals, or it tears at the corners
  add(holder, upright(nut * 0.86, nut * 0.86, top + nut * 1.25, top + nut * 1.9, 40), tones.steel);
  return { group, turning, holder };
}

type Tones = readonly [base: Color, hi: Color, lo: Color];

function solid(geometry: BufferGeometry, [base, hi, lo]: Tones, screen: Screen, hull: number, land = 0): Mesh {
  const material = new ShaderMaterial({
    vertexShader: STEEL_VERTEX,
    fragmentShader: STEEL_FRAGMENT,
    transparent: true, // not see-through: this only has it drawn after the path, which else shows through it as through wood
    uniforms: { uBase: { value: base }, uHi: { value: hi }, uLo: { value: lo }, uSize: screen.size, uPixels: screen.pixels, uHull: { value: hull }, uLand: { value: land } },
    ...(hull > 0 ? { side: BackSide } : {}),
  });
  const mesh = new Mesh(geometry, material);
  mesh.frustumCulled = false;
  mesh.renderOrder = hull > 0 ? 20 : 21; // over the path
  return mesh;
}

/** A cone's stump between two heights. */
function upright(bottom: number, top: number, from: number, to: number, around: number): BufferGeometry {
  return new CylinderGeometry(top, bottom, to - from, around).rotateX(Math.PI / 2).translate(0, 0, (from + to) / 2);
}

/** The same with flat faces. */
function faceted(geometry: BufferGeometry): BufferGeometry {
  const flat = geometry.toNonIndexed();
  geometry.dispose();
  flat.computeVertexNormals();
  return flat;
}

/** How far the flutes have turned at a height: right-handed pulls chips up, left-handed presses them down. */
function twistAt(height: number, radius: number, length: number, kind: SlotSpec['bitKind']): number {
  const turn = (Math.PI * height) / (radius * LEAD);
  if (kind === 'straight') return 0;
  if (kind === 'downcut') return -turn;
  if (kind === 'upcut') return turn;
  const change = Math.min(length / 3, 2 * radius); // compression: up from the end, down from the face
  return height < change ? turn : (Math.PI * (2 * change - height)) / (radius * LEAD);
}

/** Lands at the full radius, gullets between them, twisted from ring to ring. */
function flutesGeometry(radius: number, length: number, flutes: number, kind: SlotSpec['bitKind']): BufferGeometry {
  const position: number[] = [];
  const index: number[] = [];
  for (let ring = 0; ring <= UP; ring++) {
    const height = (length * ring) / UP;
    const runOut = Math.min(1, (1 - ring / UP) * 8); // flutes run out into the shank
    for (let k = 0; k < AROUND; k++) {
      const angle = (2 * Math.PI * k) / AROUND;
      const share = ((k * flutes) / AROUND) % 1;
      const gullet = share < LAND ? 0 : Math.sin((Math.PI * (share - LAND)) / (1 - LAND)) ** 0.6;
      const r = radius * (1 - GULLET * gullet * runOut);
      const turned = angle + twistAt(height, radius, length, kind);
      position.push(r * Math.cos(turned), r * Math.sin(turned), height);
      if (ring === UP) continue;
      const [a, b] = [ring * AROUND + k, ring * AROUND + ((k + 1) % AROUND)];
      index.push(a, b, b + AROUND, a, b + AROUND, a + AROUND);
    }
  }
  const centre = position.length / 3;
  position.push(0, 0, 0);
  for (let k = 0; k < AROUND; k++) index.push(centre, (k + 1) % AROUND, k);
  const geometry = new BufferGeometry();
  geometry.setAttribute('position', new Float32BufferAttribute(position, 3));
  geometry.setIndex(index);
  geometry.computeVertexNormals();
  return geometry;
}
