import { BoxGeometry, Group, Mesh, ShaderMaterial } from 'three';
import type { StageSizes } from '#shared/playback/index';
import { type Screen, asSegments, boxEdges, lineGeometry, lineMesh } from './lines';
import { packLines } from './packLines';
import type { Palette } from './palette';
import { HATCH_FRAGMENT, HATCH_VERTEX } from './shaders';
import { pieceOf } from './workOut';

/** The room where clamps may stand: hatched air with dashed edges, so that it cannot be taken for a thing. */
export function keepOutGroup({ keepOut, rail }: StageSizes, palette: Palette, screen: Screen): Group {
  const group = new Group();
  const period = (rail.y1 - rail.y0) / 5;
  for (const box of keepOut) {
    const geometry = new BoxGeometry(box.x1 - box.x0, box.y1 - box.y0, box.z1 - box.z0)
      .translate((box.x0 + box.x1) / 2, (box.y0 + box.y1) / 2, (box.z0 + box.z1) / 2);
    const material = new ShaderMaterial({
      vertexShader: HATCH_VERTEX,
      fragmentShader: HATCH_FRAGMENT,
      transparent: true,
      depthWrite: false,
      uniforms: { uColour: { value: palette.rule }, uPeriod: { value: period } },
    });
    const hatch = new Mesh(geometry, material);
    hatch.frustumCulled = false;
    hatch.renderOrder = 30;
    group.add(hatch);
    // Nothing has been travelled here, so every edge is "ahead": dashed.
    group.add(lineMesh(lineGeometry(packLines(asSegments(boxEdges(box, box.y0)), pieceOf(rail))), screen, { colour: palette.rule, width: 1.2, travel: { value: -1 }, order: 31 }));
  }
  return group;
}
