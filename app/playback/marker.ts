import { Mesh, PlaneGeometry, ShaderMaterial, Vector3 } from 'three';
import type { Screen } from './lines';
import type { Palette } from './palette';
import { MARKER_FRAGMENT, MARKER_VERTEX } from './shaders';

/** Half the marker's side on the screen, in the page's pixels: ring, ticks and the pale casing round both. */
const REACH = 26;

/** The place of a reading: a ring with four ticks, as on the plan, of one size on the screen. Neither wood nor bit hides it. */
export function markerMesh(palette: Palette, screen: Screen): Mesh<PlaneGeometry, ShaderMaterial> {
  const material = new ShaderMaterial({
    vertexShader: MARKER_VERTEX,
    fragmentShader: MARKER_FRAGMENT,
    transparent: true,
    depthTest: false,
    depthWrite: false,
    uniforms: {
      uPlace: { value: new Vector3() }, uReach: { value: REACH }, uSize: screen.size, uPixels: screen.pixels,
      uColour: { value: palette.tape }, uCasing: { value: palette.sheet },
    },
  });
  const mesh = new Mesh(new PlaneGeometry(2, 2), material);
  mesh.frustumCulled = false;
  mesh.renderOrder = 40; // after everything else
  mesh.visible = false;
  return mesh;
}
