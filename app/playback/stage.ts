import { BufferGeometry, DataTexture, Group, Material, Mesh, Vector2, Vector3 } from 'three';
import type { CanvasTexture, IUniform, Object3D } from 'three';
import type { StageSizes } from '#shared/playback/index';
import type { Point3 } from '#shared/geometry/point';
import type { SlotSpec } from '#shared/slot/spec';
import type { Moment } from '#shared/time/index';
import { bitGroup } from './bit';
import { endGrain, longGrain } from './grain';
import { keepOutGroup } from './keepOut';
import { type Screen, asSegments, boxEdges, lineGeometry, lineMesh, pathLines, profileLine } from './lines';
import { markerMesh } from './marker';
import { packLines } from './packLines';
import type { Palette } from './palette';
import { fieldUniforms, middleLine, middleOf, woodGroup } from './wood';
import { type WorkedOut, pieceOf } from './workOut';

/** What the stage shows, worked out beforehand. */
export interface StageParts extends WorkedOut {
  readonly sizes: StageSizes;
  readonly spec: Pick<SlotSpec, 'flutes' | 'bitKind'>;
}

/** A travel that no line is ahead of: outlines are solid. */
const BEHIND = 1e30;

/** Turns of the bit per second of program: slow enough to be seen turning, at every speed of playback. */
const TURNS = 0.7;

/**
 * Everything in the picture. A moment of the program is three numbers for the bit and one for the wood and the path, so
 * that any moment costs the same and nothing is made while it plays.
 */
export class Stage {
  readonly root = new Group();
  readonly sizes: StageSizes;
  private readonly travel = { value: 0 };
  private readonly section = { value: false };
  private readonly screen: Screen = { size: { value: new Vector2(1, 1) }, pixels: { value: 1 } };
  private readonly long: CanvasTexture = longGrain();
  private readonly end: CanvasTexture = endGrain();
  private bit: ReturnType<typeof bitGroup> | null = null;
  private wood: Group | null = null;
  private edges: Object3D | null = null;
  private halfEdges: Object3D | null = null;
  private marker: ReturnType<typeof markerMesh> | null = null;
  private pointed: Point3 | null = null;

  private readonly field: Record<string, IUniform>;

  constructor(private readonly parts: StageParts, palette: Palette) {
    this.sizes = parts.sizes;
    this.field = fieldUniforms(parts.field);
    this.paint(palette);
  }

  /** Makes every part in the palette's colours; again when the theme or the species changes. */
  paint(palette: Palette): void {
    const old = this.bit;
    this.clear();
    const { sizes, spec, lines, field } = this.parts;
    const { rail } = sizes;
    const middle = middleOf(rail, field);
    this.wood = woodGroup(rail, field, this.field, palette, { travel: this.travel, section: this.section, long: this.long, end: this.end });
    this.edges = this.outline(boxEdges(rail, rail.y0), palette);
    this.halfEdges = new Group().add(
      this.outline(boxEdges(rail, middle, false), palette),
      profileLine(middleLine(rail, field), middle, rail.z1, this.screen, { colour: palette.ink, width: 2, travel: this.travel, order: 5, ...(field ? { field: this.field } : {}) }),
    );
    this.bit = bitGroup(sizes, spec, palette, this.screen);
    if (old) {
      this.bit.group.position.copy(old.group.position);
      this.bit.holder.visible = old.holder.visible;
    }
    this.marker = markerMesh(palette, this.screen);
    this.root.add(this.wood, this.edges, this.halfEdges, pathLines(lines, this.screen, palette, { travel: this.travel, section: this.section, middle }), this.bit.group, keepOutGroup(sizes, palette, this.screen), this.marker);
    // Nothing here is pointed at: without this every move of the pointer would be tried against every triangle.
    this.root.traverse((part) => (part.raycast = () => undefined));
    this.showSection(this.section.value);
    this.point(this.pointed);
  }

  /** Sets the picture to a moment of the program. */
  show(moment: Moment, seconds: number): void {
    this.travel.value = moment.travel;
    if (!this.bit) return;
    const { rail, safeHeight } = this.sizes;
    // Before the program has said where the bit is, it waits over the work zero.
    this.bit.group.position.set(stated(moment.x, rail.x0), stated(moment.y, rail.y0), stated(moment.z, safeHeight));
    this.bit.turning.rotation.z = -seconds * TURNS * 2 * Math.PI;
  }

  /** Marks a place of the program, or none. */
  point(place: Point3 | null): void {
    this.pointed = place;
    if (!this.marker) return;
    this.marker.visible = place !== null;
    const at: unknown = this.marker.material.uniforms.uPlace?.value;
    if (place && at instanceof Vector3) at.set(place.x, place.y, place.z);
  }

  showSection(on: boolean): void {
    this.section.value = on;
    if (this.edges) this.edges.visible = !on;
    if (this.halfEdges) this.halfEdges.visible = on;
    const cap = this.wood?.getObjectByName('cap');
    if (cap) cap.visible = on;
  }

  /** From straight above, the nut and the spindle would hide the bit. */
  showHolder(on: boolean): void {
    if (this.bit) this.bit.holder.visible = on;
  }

  /** Tells the lines how large the canvas is, in device pixels. */
  resize(width: number, height: number, pixels: number): void {
    this.screen.size.value.set(width, height);
    this.screen.pixels.value = pixels;
  }

  dispose(): void {
    this.clear();
    const falls: unknown = this.field.uFalls?.value;
    if (falls instanceof DataTexture) falls.dispose();
    this.long.dispose();
    this.end.dispose();
  }

  private outline(lines: Parameters<typeof asSegments>[0], palette: Palette): Object3D {
    return lineMesh(lineGeometry(packLines(asSegments(lines), pieceOf(this.sizes.rail))), this.screen, { colour: palette.ink, width: 2, lift: 0.005, travel: { value: BEHIND }, order: 5 });
  }

  private clear(): void {
    this.root.traverse((part) => {
      if (!(part instanceof Mesh)) return;
      if (part.geometry instanceof BufferGeometry) part.geometry.dispose();
      if (part.material instanceof Material) part.material.dispose();
    });
    this.root.clear();
  }
}

const stated = (value: number, otherwise: number): number => (value === value ? value : otherwise);
