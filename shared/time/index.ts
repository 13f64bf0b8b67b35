// How long a program takes, and where the bit is at any moment. Works from what the reader made of the text.

export { type Timeline, timeOf } from './timeline'; // steps → seconds, lengths and speeds of each
export { isMotion } from '../reader/motion'; // a step that moves, of a timeline's
export { type Moment, newMoment, positionAt, stepAt } from './positionAt'; // seconds → point, step, travel
export { type Dynamics, defaultDynamics, timeAssumes } from './dynamics'; // how the machine moves, and what was assumed
export { type MutablePoint, pointAlong } from './along'; // a motion and a share of it → a point
