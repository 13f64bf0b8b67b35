// What playback draws, worked out from the motions the reader saw: no Vue, no graphics library.

export { type Box, type StageSizes, stageSizes } from './block'; // spec → rail, bit and clamps in program coordinates
export { type Segments, pathSegments } from './segments'; // timeline → straight pieces with travel
export { type Removal, buildRemoval, removalInSlices } from './removal'; // pieces → when the wood goes, and how deep
export { type Falls, depthAt, packFalls } from './layers'; // that, at one moment; and as a texture
export { type PlanRun, drawnAt, planRuns } from './plan'; // pieces → the cut from above, and how much of it is behind
export { finishSteps } from './finish'; // timeline → which steps run along the walls at a depth already cut
export { type Pass, findPasses, passAt } from './passes'; // timeline → passes
