import { PerspectiveCamera, Vector3 } from 'three';
import type { Box } from '#shared/playback/index';
import type { View } from './views';

/** From the middle of what is looked at to the eye. */
const TOWARD: Readonly<Record<View, readonly [number, number, number]>> = {
  corner: [-0.9, -0.5, 0.5],
  above: [0, -0.001, 1], // not straight down: the camera would not know which way is up
  front: [0, -1, 0.16],
  end: [-1, -0.12, 0.42],
  bit: [-0.72, -0.8, 0.62],
};

const corners = ({ x0, x1, y0, y1, z0, z1 }: Box): Vector3[] => [x0, x1].flatMap((x) => [y0, y1].flatMap((y) => [z0, z1].map((z) => new Vector3(x, y, z))));

/** Places the camera so that the whole box is in the picture with a margin; answers what it looks at. */
export function frame(camera: PerspectiveCamera, box: Box, view: View, margin = 0.08): Vector3 {
  const target = new Vector3((box.x0 + box.x1) / 2, (box.y0 + box.y1) / 2, (box.z0 + box.z1) / 2);
  const toward = new Vector3(...TOWARD[view]).normalize();
  const points = corners(box);
  let far = Math.max(box.x1 - box.x0, box.y1 - box.y0, box.z1 - box.z0) * 2;
  const right = new Vector3();
  const up = new Vector3();
  // Perspective makes the near end larger than the far one, so middle and distance are found together, by turns.
  for (let round = 0; round < 24; round++) {
    camera.position.copy(target).addScaledVector(toward, far);
    camera.lookAt(target);
    camera.updateMatrixWorld();
    let [left, rightmost, low, high] = [Infinity, -Infinity, Infinity, -Infinity];
    for (const point of points) {
      const seen = point.clone().project(camera);
      [left, rightmost, low, high] = [Math.min(left, seen.x), Math.max(rightmost, seen.x), Math.min(low, seen.y), Math.max(high, seen.y)];
    }
    const tall = Math.tan((camera.fov * Math.PI) / 360) * far;
    right.setFromMatrixColumn(camera.matrixWorld, 0);
    up.setFromMatrixColumn(camera.matrixWorld, 1);
    target.addScaledVector(right, ((left + rightmost) / 2) * tall * camera.aspect * 0.7).addScaledVector(up, ((low + high) / 2) * tall * 0.7);
    const fill = Math.max((rightmost - left) / 2, (high - low) / 2) / (1 - margin);
    // Nearer than this a corner would pass behind the eye.
    const nearest = Math.max(...points.map((point) => point.clone().sub(target).dot(toward))) * 1.05;
    far = Math.max(nearest, far * (1 + (fill - 1) * 0.6));
  }
  camera.near = far / 200;
  camera.far = far * 20;
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
