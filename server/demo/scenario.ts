import type { BitInput } from '#shared/shop/bit';
import type { MachineInput } from '#shared/shop/machine';
import type { SlotRequestInput } from '#shared/slot/request';

// The demo's shop, its people and its work: invented, all of it.

export const DEMO_SHOP = 'Marrow Creek Joinery';

export const DEMO_PEOPLE = [
  { role: 'owner', name: 'Ines Okafor-Lindqvist', email: 'ines@marrowcreek.example.com' },
  { role: 'hand', name: 'Teo Varga', email: 'teo@marrowcreek.example.com' },
  { role: 'customer', name: 'Halvard Prewitt', email: 'halvard@station9.example.com' },
] as const;

export const DEMO_MACHINE: MachineInput = {
  units: 'in', name: 'Router table', workArea: { x: 32, y: 32, z: 4 }, topFeed: { x: 200, y: 200, z: 60 }, acceleration: 20,
  spindleRange: [8000, 24000], spindle: 'program',
  holdings: [
    { kind: 'end clamps', widest: null, height: 0.5, reach: 0.5 },
    { kind: 'side vise', widest: 4, height: 0, reach: 0 },
    { kind: 'fence and tape', widest: null, height: 0, reach: 0 },
  ],
};

const bit = { units: 'in', flutes: 2, colletDiameter: 1.25, kind: 'straight' } as const;
export const DEMO_BITS: readonly BitInput[] = [
  { ...bit, name: '1/4 straight', diameter: 0.25, cuttingLength: 0.75, stickout: 1.25 },
  { ...bit, name: '1/4 down-cut', diameter: 0.25, cuttingLength: 0.875, stickout: 1.25, kind: 'downcut', chipLoadRange: [0.002, 0.005] },
  { ...bit, name: '1/8 straight', diameter: 0.125, cuttingLength: 0.5, stickout: 1 },
];

const rail = {
  units: 'in', length: '24 1/2', width: '3/8', depth: '3/16', stopMargin: '7/8', railWidth: '1 1/4', railThickness: '3/4', wood: 'white-oak',
  bitDiameter: '1/4', stepdown: '3/32', spindleSpeed: 16000, feed: 100, plungeFeed: 25,
} as const;

/** `program`: made at the start, so that the bench has something to cut. */
export const DEMO_RAILS: readonly { readonly request: SlotRequestInput; readonly quantity: number; readonly dueIn: number; readonly program: boolean }[] = [
  { request: { ...rail, name: 'Day room, rail A' }, quantity: 1, dueIn: 9, program: true },
  { request: { ...rail, name: 'Day room, rail B' }, quantity: 1, dueIn: 9, program: true },
  { request: { ...rail, name: 'Day room, rail C' }, quantity: 1, dueIn: 9, program: false },
  {
    request: {
      units: 'mm', name: 'Club medals shelf', length: 560, width: 8, depth: 5, stopMargin: 20, railWidth: 40, railThickness: 19, wood: 'cherry',
      bitDiameter: 6, stepdown: 2.5, spindleSpeed: 16000, feed: 2500, plungeFeed: 600,
    },
    quantity: 3, dueIn: 24, program: true,
  },
];
