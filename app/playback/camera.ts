import { type PerspectiveCamera, Vector3 } from 'three';
import type { Box } from '#shared/playback/index';
import type { View } from './views';

/** From the middle of what is looked at to the eye. */
const TOWARD: Readonly<Record<View, readonly [number, number, number]>> = {
  corner: [-0.85, -0.6, 0.42],
  above: [0, -0.001, 1], // not straight down: the camera would not know which way is up
  front: [0, -1, 0.16],
  end: [-1, -0.12, 0.42],
  bit: [-0.72, -0.8, 0.62],
};

const corners = ({ x0, x1, y0, y1, z0, z1 }: Box): Vector3[] => [x0, x1].flatMap((x) => [y0, y1].flatMap((y) => [z0, z1].map((z) => new Vector3(x, y, z))));

const TALL_CORNER = [-0.92, -0.3, 0.5] as const;

/** Degrees of the picture's height: flat for the views a drawing has, deep for those one looks along the rail in. */
const LENS: Readonly<Record<View, number>> = { corner: 38, above: 12, front: 12, end: 30, bit: 26 };

/** Places the camera so that the whole box is in the picture with a margin; answers what it looks at. */
export function frame(camera: PerspectiveCamera, box: Box, view: View, margin = 0.07): Vector3 {
  // In a tall picture one looks further along the rail, or it would be a stick across the middle.
  const toward = new Vector3(...(view === 'corner' && camera.aspect < 1.2 ? TALL_CORNER : TOWARD[view])).normalize();
  const right = new Vector3().crossVectors(camera.up, toward).normalize();
  const up = new Vector3().crossVectors(toward, right);
  const middle = new Vector3((box.x0 + box.x1) / 2, (box.y0 + box.y1) / 2, (box.z0 + box.z1) / 2);
  // Each corner from the middle of the box: across the picture, up it, and towards the eye.
  const points = corners(box).map((corner) => corner.sub(middle)).map((p) => [p.dot(right), p.dot(up), p.dot(toward)] as const);
  const nearest = Math.max(...points.map(([, , near]) => near));
  camera.fov = LENS[view];
  const tall = Math.tan((camera.fov * Math.PI) / 360) * (1 - margin);
  const wide = tall * camera.aspect;

  // From a distance: the least and greatest place in the picture that keeps every corner in, across and up.
  const room = (far: number, axis: 0 | 1, half: number) => {
    const least = Math.max(...points.map((p) => p[axis] - half * (far - p[2])));
    const most = Math.min(...points.map((p) => p[axis] + half * (far - p[2])));
    return { middle: (least + most) / 2, spare: most - least };
  };
  // The nearest distance with room both ways, by halving: farther always has more.
  let near = nearest;
  let far = nearest + 4 * Math.max(...points.flatMap(([x, y, z]) => [Math.abs(x) / wide, Math.abs(y) / tall, Math.abs(z)]));
  for (let round = 0; round < 40; round++) {
    const half = (near + far) / 2;
    if (room(half, 0, wide).spare >= 0 && room(half, 1, tall).spare >= 0) far = half;
    else near = half;
  }
  const target = middle.clone().addScaledVector(right, room(far, 0, wide).middle).addScaledVector(up, room(far, 1, tall).middle);
  camera.position.copy(target).addScaledVector(toward, far);
  camera.near = Math.max((far - nearest) / 20, far / 500);
  camera.far = far * 12;
  camera.lookAt(target);
  camera.updateProjectionMatrix();
  return target;
}

/** Turns the camera about what it looks at: `across` round the upright axis, `up` towards the top, both in radians. */
export function turnCamera(camera: PerspectiveCamera, target: Vector3, across: number, up: number, nearer = 1): void {
  const offset = camera.position.clone().sub(target);
  const level = Math.hypot(offset.x, offset.y);
  const far = offset.length() * nearer;
  const round = Math.atan2(offset.y, offset.x) + across;
  const height = Math.min(1.55, Math.max(-1.2, Math.atan2(offset.z, level) + up)); // short of straight up and down
  camera.position.set(Math.cos(round) * Math.cos(height), Math.sin(round) * Math.cos(height), Math.sin(height)).multiplyScalar(far).add(target);
  camera.lookAt(target);
}
