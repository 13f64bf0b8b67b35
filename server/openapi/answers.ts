import { z } from 'zod';
import type { ProgramSummary } from '#shared/makeProgram';
import { UNITS } from '#shared/measure/units';
import { type Finding, type Readback, RULES, SEVERITIES } from '#shared/readback/finding';
import { FIELDS } from '#shared/slot/fields';
import { BIT_KINDS, DIRECTIONS, ENDS, SPINDLE_CONTROLS, type SlotSpec, WORK_ZEROS } from '#shared/slot/spec';
import { WOODS } from '#shared/wood/woods';

// Shapes of the answers, for the document and for the test that holds real answers against it. Each is checked
// against the type the code works with, so that neither can drift from the other.

const QUANTITIES = ['length', 'feed', 'angle', 'speed', 'chipLoad', 'count', 'words'] as const;
const pair = z.tuple([z.number(), z.number()]).readonly();
const fieldName = z.enum(Object.keys(FIELDS) as [keyof SlotSpec, ...(keyof SlotSpec)[]]);

export const specSchema = z.strictObject({
  units: z.enum(UNITS),
  name: z.string(),
  length: z.number(),
  width: z.number(),
  depth: z.number(),
  stopMargin: z.number(),
  bitDiameter: z.number(),
  stepdown: z.number(),
  railWidth: z.number(),
  railThickness: z.number(),
  ends: z.enum(ENDS),
  wood: z.enum(WOODS),
  flutes: z.number(),
  spindleSpeed: z.number(),
  feed: z.number(),
  plungeFeed: z.number(),
  rampAngle: z.number(),
  stepover: z.number(),
  finishAllowance: z.number(),
  direction: z.enum(DIRECTIONS),
  cuttingLength: z.number(),
  bitKind: z.enum(BIT_KINDS),
  centreCutting: z.boolean(),
  chipLoadRange: pair.nullable(),
  colletDiameter: z.number(),
  stickout: z.number(),
  clampHeight: z.number(),
  clampReach: z.number(),
  safeHeight: z.number(),
  workZero: z.enum(WORK_ZEROS),
  spindle: z.enum(SPINDLE_CONTROLS),
  machine: z.strictObject({
    travel: z.strictObject({ x: z.number(), y: z.number(), z: z.number() }).optional(),
    topFeed: z.number().optional(),
    acceleration: z.number().optional(),
    spindleRange: pair.optional(),
    heavy: z.boolean().optional(),
  }).nullable(),
}) satisfies z.ZodType<SlotSpec>;

const findingSchema = z.strictObject({
  rule: z.enum(RULES),
  severity: z.enum(SEVERITIES),
  at: z.strictObject({ line: z.number(), column: z.number() }),
  point: z.strictObject({ x: z.number(), y: z.number(), z: z.number() }).nullable(),
  quantity: z.enum(QUANTITIES),
  wanted: z.union([z.number(), z.array(z.number()), z.string()]).nullable(),
  measured: z.union([z.number(), z.array(z.number()), z.string()]).nullable(),
  reason: z.string().nullable(),
}) satisfies z.ZodType<Finding>;

export const readbackSchema = z.strictObject({
  verdict: z.enum(['agrees', 'caution', 'disagrees']),
  findings: z.array(findingSchema),
}) satisfies z.ZodType<Readback>;

export const summarySchema = z.strictObject({
  railLength: z.number(),
  passes: z.array(z.number()),
  seconds: z.number(),
  timeAssumes: z.string(),
  cutLength: z.number(),
  rapidLength: z.number(),
  lines: z.number(),
  chipLoad: z.number(),
  chipLoadRange: z.strictObject({ least: z.number(), most: z.number(), source: z.enum(['common practice', 'the bit\'s maker']) }),
  surfaceSpeed: z.number(),
  removalRate: z.number(),
  assumed: z.array(fieldName),
  notes: z.array(z.string()),
}) satisfies z.ZodType<ProgramSummary>;

const mark = z.string().regex(/^[A-Z2-9]{3}-[A-Z2-9]{3}$/).describe('The program mark: six letters and digits, without look-alikes.');
const sha256 = z.string().regex(/^[0-9a-f]{64}$/).describe("SHA-256 of the program's bytes.");
const text = z.string().describe('The program itself: RS-274 text.');

export const programSchema = z.strictObject({
  program: text,
  fileName: z.string(),
  mark,
  sha256,
  spec: specSchema,
  summary: summarySchema,
  readback: readbackSchema,
});

export const lookupSchema = z.strictObject({
  mark,
  programs: z.array(z.strictObject({ sha256, fileName: z.string(), program: text, spec: specSchema, createdAt: z.string().describe('When it was first made: ISO 8601, UTC.') })),
});

/** Problem details (RFC 9457). */
export const problemSchema = z.strictObject({
  type: z.literal('about:blank'),
  title: z.string(),
  status: z.number(),
  detail: z.string(),
  errors: z.array(z.strictObject({
    path: z.string().describe('The field, dotted; empty where the whole body is meant.'),
    message: z.string(),
  })).optional(),
  readback: readbackSchema.optional().describe('Only where a program was withheld.'),
});
