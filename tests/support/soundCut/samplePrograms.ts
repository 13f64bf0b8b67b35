import type { JudgedSpec } from './types';

/**
 * Programs written by hand, for judging the judge. Their numbers are worked out beside them.
 */
export interface Sample {
  readonly spec: JudgedSpec;
  readonly program: string;
}

/**
 * Rail 19 x 1 3/4, groove 16 1/2 x 1/2 x 3/16, bit 1/4: the bit's middle keeps to X 1.375 to 17.625, Y 0.75 to 1.
 * First ramp 0.02 + 0.0938 over 2.18 in: 2.988 degrees; second 0.0937 over 1.8 in: 2.980 degrees.
 */
export const GROOVE: Sample = {
  spec: {
    units: 'in', length: 16.5, width: 0.5, depth: 0.1875, stopMargin: 1.25, bitDiameter: 0.25, stepdown: 0.09375,
    railWidth: 1.75, safeHeight: 0.75,
  },
  program: `%
(K74-QDM GROOVE)
(RAIL 19.0000 X 1.7500, STOP MARGIN 1.2500)
G20
G17 G90 G94
G40 G49 G80
G54
G0 Z0.7500
S16000 M3
G0 X1.3750 Y0.7500
G0 Z0.0200
G1 X3.5550 Z-0.0938 F60.0
G1 X17.6250 F100.0
G1 Y1.0000
G1 X1.3750
G1 Y0.7500
G1 X3.5550
G1 X5.3550 Z-0.1875 F60.0
G1 X17.6250 F100.0
G1 Y1.0000
G1 X1.3750
G1 Y0.7500
G1 X5.3550
G0 Z0.7500
M5
M30
%
`,
};

/**
 * A wide one in one pass: slot 6 x 3/4 x 1/16, bit 1/4, middle of the bit X 1.125 to 6.875, Y 0.5 to 1. The middle line,
 * a lap 0.1 inside, the wall lap. Ramp 0.0825 over 1.6 in: 2.952 degrees.
 */
export const WIDE: Sample = {
  spec: {
    units: 'in', length: 6, width: 0.75, depth: 0.0625, stopMargin: 1, bitDiameter: 0.25, stepdown: 0.0625,
    railWidth: 1.5, safeHeight: 0.75,
  },
  program: `%
(K74-QDM WIDE)
G20
G17 G90 G94
G40 G49 G80
G54
G0 Z0.7500
S16000 M3
G0 X1.3750 Y0.7500
G0 Z0.0200
G1 X2.9750 Z-0.0625 F60.0
G1 X6.6250 F100.0
G1 X1.3750
G1 X1.2250 Y0.6000
G1 X6.7750
G1 Y0.9000
G1 X1.2250
G1 Y0.6000
G1 X1.1250 Y0.5000
G1 X6.8750
G1 Y1.0000
G1 X1.1250
G1 Y0.5000
G0 Z0.7500
M5
M30
%
`,
};

/**
 * Round ends and a finish lap, in millimetres: slot 100 x 12 x 3, bit 6, allowance 1; the rail's corner is zero, so the
 * ends' middles stand at X 26 and 114, Y 20. Ramp 3.5 over 67: 2.990 degrees.
 */
export const ROUND: Sample = {
  spec: {
    units: 'mm', length: 100, width: 12, depth: 3, stopMargin: 20, bitDiameter: 6, stepdown: 3, railWidth: 40,
    ends: 'round', finishAllowance: 1, cuttingLength: 12, safeHeight: 18,
  },
  program: `%
(K74-QDM ROUND)
G21
G17 G90 G94
G40 G49 G80
G54
G0 Z18.000
S16000 M3
G0 X26.000 Y18.000
G0 Z0.500
G1 X93.000 Z-3.000 F1500.0
G1 X114.000 F2500.0
G3 X116.000 Y20.000 I0.000 J2.000
G3 X114.000 Y22.000 I-2.000 J0.000
G1 X26.000
G3 X24.000 Y20.000 I0.000 J-2.000
G3 X26.000 Y18.000 I2.000 J0.000
G1 X93.000
G1 Y17.000
G1 X114.000
G3 X117.000 Y20.000 I0.000 J3.000
G3 X114.000 Y23.000 I-3.000 J0.000
G1 X26.000
G3 X23.000 Y20.000 I0.000 J-3.000
G3 X26.000 Y17.000 I3.000 J0.000
G1 X93.000
G0 Z18.000
M5
M30
%
`,
};

/**
 * One bit wide, spindle by hand, zero in the rail's middle: slot 4 x 1/4 x 1/8 in two passes, X -1.875 to 1.875.
 * Each pass ramps there and back over itself. Ramps 0.0825 over 1.6 in and 0.0625 over 1.2 in, the same under 3 degrees.
 */
export const LINE: Sample = {
  spec: {
    units: 'in', length: 4, width: 0.25, depth: 0.125, stopMargin: 1, bitDiameter: 0.25, stepdown: 0.0625, railWidth: 1,
    workZero: 'centre', spindle: 'hand', safeHeight: 0.75,
  },
  program: `%
(K74-QDM LINE)
G20
G17 G90 G94
G40 G49 G80
G54
G0 Z0.7500
G0 X-1.8750 Y0.0000
(SWITCH THE SPINDLE ON)
M0
G0 Z0.0200
G1 X-0.2750 Z-0.0625 F60.0
G1 X-1.8750 F100.0
G1 X1.8750
G1 X0.6750 Z-0.1250 F60.0
G1 X1.8750 F100.0
G1 X-1.8750
G0 Z0.7500
(SWITCH THE SPINDLE OFF)
M0
M30
%
`,
};

export const SAMPLES: readonly Sample[] = [GROOVE, WIDE, ROUND, LINE];
