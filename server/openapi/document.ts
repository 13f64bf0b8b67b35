import { z } from 'zod';
import { FIELDS } from '#shared/slot/fields';
import { slotRequestSchema } from '#shared/slot/request';
import { lookupSchema, problemSchema, programSchema } from './answers';

const answer = (schema: z.ZodType) => z.toJSONSchema(schema, { io: 'output' });

/** The request's schema as the server has it, each field described by its words and where its default comes from. */
function requestSchema() {
  const schema = z.toJSONSchema(slotRequestSchema, { io: 'input' });
  for (const [field, { words, defaultSource }] of Object.entries(FIELDS)) {
    const property = schema.properties?.[field];
    if (typeof property === 'object') property.description = defaultSource === null ? words : `${words} (default: ${defaultSource})`;
  }
  return schema;
}

const problems = (statuses: Readonly<Record<number, string>>) => Object.fromEntries(
  Object.entries(statuses).map(([status, description]) => [status, {
    description,
    ...(status === '429' && { headers: { 'Retry-After': { description: 'Seconds until it is worth asking again.', schema: { type: 'integer' } } } }),
    content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
  }]),
);

const reference = (name: string) => ({ schema: { $ref: `#/components/schemas/${name}` } });

/** The rail of the README: numbers or text in the trade's notation, as it comes. */
export const EXAMPLE_REQUEST = {
  units: 'in', name: 'Rail A', wood: 'white-oak',
  length: '24 1/2', width: '3/8', depth: '3/16', stopMargin: '7/8', railWidth: '1 1/4', railThickness: '3/4',
  bitDiameter: '1/4', stepdown: '3/32', spindleSpeed: 16000, feed: 100, plungeFeed: 25,
} as const;

/** Everything the API takes and answers; the catch-all route reads from it which methods an address knows. */
export const openApiDocument = {
  openapi: '3.1.1',
  info: {
    title: 'Tallyrail',
    version: '0.1.0',
    description: "From a slot spec to a plain RS-274 program that has been read back and measured before anyone may download it. The machine's manual, the bit maker's limits and your local rules come first.",
  },
  servers: [{ url: '/' }],
  paths: {
    '/api/programs': {
      post: {
        operationId: 'makeProgram',
        summary: 'Make the program for one slot',
        requestBody: { required: true, content: { 'application/json': { ...reference('SlotRequest'), example: EXAMPLE_REQUEST } } },
        responses: {
          200: {
            description: 'The program, read back: nothing measured disagrees with the spec. Cautions stand in readback.',
            headers: { 'Program-Mark': { description: 'With text/plain only.', schema: { type: 'string' } } },
            content: { 'application/json': reference('Program'), 'text/plain': { schema: { type: 'string' } } },
          },
          ...problems({
            400: 'The body is not JSON.',
            406: 'Accept names nothing that can be sent.',
            413: 'The body is larger than 64 kB.',
            415: 'The body is not sent as JSON.',
            422: 'The spec is impossible or dangerous; errors names every field and what would work.',
            429: 'Too many programs from one address.',
            500: 'The program was read back and disagrees with the spec; readback has the findings, and there is no text.',
          }),
        },
      },
    },
    '/api/programs/{mark}': {
      get: {
        operationId: 'findPrograms',
        summary: 'Every program that bears a mark',
        parameters: [{ name: 'mark', in: 'path', required: true, description: 'As shown or typed: K74-QDM, k74qdm.', schema: { type: 'string' } }],
        responses: {
          200: { description: 'The programs, the oldest first.', content: { 'application/json': reference('Lookup') } },
          ...problems({ 404: 'No program bears the mark.', 406: 'Accept names nothing that can be sent.', 422: 'That is not a mark.' }),
        },
      },
    },
    '/api/openapi.json': {
      get: {
        operationId: 'describe',
        summary: 'This document',
        responses: { 200: { description: 'OpenAPI 3.1.', content: { 'application/json': { schema: { type: 'object' } } } } },
      },
    },
  },
  components: {
    schemas: {
      SlotRequest: requestSchema(),
      Program: answer(programSchema),
      Lookup: answer(lookupSchema),
      Problem: answer(problemSchema),
    },
  },
};
