import type { NewCommission } from '#shared/commission/commission';
import type { Stage } from '#shared/commission/stages';
import type { WorkInput } from '#shared/commission/work';
import { DAY_ROOM_BUILD, DAY_ROOM_KINDS, DAY_ROOM_PIECE } from '#shared/demo/dayRoom';
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

/** A commission as the demo begins with it; days are from the start, earlier ones below zero. */
interface DemoCommission {
  readonly asked: Omit<NewCommission, 'due'>;
  readonly dueIn: number;
  readonly stages: readonly (readonly [Stage, number])[];
  readonly work: WorkInput;
}

export const DEMO_COMMISSIONS: readonly DemoCommission[] = [
  {
    asked: {
      name: '42 coins for the day room', occasion: 'The squad\'s twentieth year', wall: '36 in wide between the lockers, 24 in high', units: 'in', wishes: 'The founders\' coins where one sees them first.',
      contact: { customer: 'Station 9 Rescue Squad', person: 'Halvard Prewitt', email: 'halvard@station9.example.com', phone: '555-0109' },
    },
    dueIn: 17,
    stages: [['enquiry', -28], ['quoted', -24], ['approved', -19], ['deposit paid', -15]],
    work: {
      tally: { units: 'in', kinds: DAY_ROOM_KINDS.map(({ toCome: _none, ...kind }) => kind) }, toCome: [], piece: DAY_ROOM_PIECE, pins: [], build: DAY_ROOM_BUILD,
      surface: { colour: 'none', finish: 'drying-oil', coats: 3, coatHours: 1 }, gauge: 18,
      yard: { kerf: '1/8', lengthsFeet: [6, 8], offcuts: [], centsPerBoardFoot: { 'walnut': 1250, 'cherry': 890, 'white-oak': 980, 'poplar': 420 } },
    },
  },
  {
    asked: {
      name: 'Club medals shelf', occasion: 'Regatta medals of three boathouses', wall: 'a ledge 700 mm wide', units: 'mm', wishes: 'Three shelves alike, one for each boathouse.',
      contact: { customer: 'Lowmoor Rowing Club', person: 'Ottilie Brandreth', email: 'medals@lowmoor.example.com', phone: '' },
    },
    dueIn: 31,
    stages: [['enquiry', -6]],
    work: {
      tally: { units: 'mm', kinds: [{ name: 'Regatta medal', diameter: 30, thickness: 7.2, count: 12 }] }, toCome: [{ kind: 'Regatta medal', count: 2 }], pins: [],
      piece: {
        units: 'mm', kind: 'shelf', style: 'upright', width: 600, height: 40, lanes: 1, railLanes: [1], gap: 8, railWidth: 40, railThickness: 19, grooveWidth: 8, grooveDepth: 5, stopMargin: 20, laneMargin: 0,
      },
      build: { boardThickness: 19, odd: 'cherry', even: 'cherry', union: 'cherry', rails: 'cherry', battens: 'poplar', batten: { count: 0, width: 38, thickness: 19, inset: 0 } },
      surface: { colour: 'none', finish: 'water-polyurethane', coats: 3, coatHours: 1 }, gauge: 18,
      yard: { kerf: 3, lengthsFeet: [6, 8], offcuts: [], centsPerBoardFoot: { cherry: 890 } },
    },
  },
];

/** `program`: made at the start, so that the bench has something to cut. `of`: the commission by its place, and the rail's label there. */
export const DEMO_RAILS: readonly { readonly request: SlotRequestInput; readonly quantity: number; readonly dueIn: number; readonly program: boolean; readonly of: readonly [commission: number, label: string] }[] = [
  { request: { ...rail, name: 'Day room, rail A' }, quantity: 1, dueIn: 9, program: true, of: [0, 'A'] },
  { request: { ...rail, name: 'Day room, rail B' }, quantity: 1, dueIn: 9, program: true, of: [0, 'B'] },
  { request: { ...rail, name: 'Day room, rail C' }, quantity: 1, dueIn: 9, program: false, of: [0, 'C'] },
  {
    request: {
      units: 'mm', name: 'Club medals shelf', length: 560, width: 8, depth: 5, stopMargin: 20, railWidth: 40, railThickness: 19, wood: 'cherry',
      bitDiameter: 6, stepdown: 2.5, spindleSpeed: 16000, feed: 2500, plungeFeed: 600,
    },
    quantity: 3, dueIn: 24, program: true, of: [1, 'A'],
  },
];
