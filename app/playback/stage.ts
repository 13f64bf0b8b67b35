import { BufferGeometry, DataTexture, Group, Material, Mesh, Vector2 } from 'three';
import type { CanvasTexture, IUniform, Object3D } from 'three';
import type { Removal, Segments, StageSizes } from '#shared/playback/index';
import type { SlotSpec } from '#shared/slot/spec';
import type { Moment } from '#shared/time/index';
import { bitGroup } from './bit';
import { endGrain, longGrain } from './grain';
import { keepOutGroup } from './keepOut';
import { type Screen, asSegments, boxEdges, lineGeometry, lineMesh, pathLines, pieceOf, profileLine } from './lines';
import type { Palette } from './palette';
import { fieldUniforms, middleLine, middleOf, woodGroup } from './wood';

/** What the stage shows, worked out beforehand. */
export interface StageParts {
  readonly sizes: StageSizes;
  readonly spec: Pick<SlotSpec, 'flutes' | 'bitKind'>;
  readonly segments: Segments;
  readonly removal: Removal | null;
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

  private readonly field: Record<string, IUniform>;

  constructor(private readonly parts: StageParts, palette: Palette) {
    this.sizes = parts.sizes;
    this.field = fieldUniforms(parts.removal);
    this.paint(palette);
  }

  /** Makes every part in the palette's colours; again when the theme or the species changes. */
  paint(palette: Palette): void {
    const old = this.bit;
    this.clear();
    const { sizes, spec, segments, removal } = this.parts;
    const { rail } = sizes;
    const middle = middleOf(rail, removal);
    this.wood = woodGroup(rail, removal, this.field, palette, { travel: this.travel, section: this.section, long: this.long, end: this.end });
    this.edges = this.outline(boxEdges(rail, rail.y0), palette);
    this.halfEdges = new Group().add(
      this.outline(boxEdges(rail, middle, false), palette),
      profileLine(middleLine(rail, removal), middle, rail.z1, this.screen, { colour: palette.ink, width: 2, travel: this.travel, order: 5, ...(removal ? { field: this.field } : {}) }),
    );
    this.bit = bitGroup(sizes, spec, palette, this.screen);
    if (old) {
      this.bit.group.position.copy(old.group.position);
      this.bit.holder.visible = old.holder.visible;
    }
    this.root.add(this.wood, this.edges, this.halfEdges, pathLines(segments, this.screen, pieceOf(rail), palette, { travel: this.travel, section: this.section, middle }), this.bit.group, keepOutGroup(sizes, palette, this.screen));
    // Nothing here is pointed at: without this every move of the pointer would be tried against every triangle.
    this.root.traverse((part) => (part.raycast = () => undefined));
    this.showSection(this.section.value);
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
    return lineMesh(lineGeometry(asSegments(lines), pieceOf(this.sizes.rail)), this.screen, { colour: palette.ink, width: 2, lift: 0.005, travel: { value: BEHIND }, order: 5 });
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
