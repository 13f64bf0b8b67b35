import { Validator } from '@seriousme/openapi-schema-validator';
import Ajv2020 from 'ajv/dist/2020';
import { describe, expect, it } from 'vitest';
import { WITHOUT_SESSION } from '#server/access/table';
import { BAD_INPUTS } from './badInputs';
import { NEEDS_A_PLUNGE, type ProgramBody, RAIL, post, url } from './support';

interface Document {
  readonly openapi: string;
  readonly paths: Readonly<Record<string, Readonly<Record<string, { readonly responses: Readonly<Record<string, unknown>> }>>>>;
  readonly components: { readonly schemas: Readonly<Record<string, object>> };
}

const read = async () => await (await fetch(url('/api/openapi.json'))).json() as Document;

/** A check of one of the document's schemas that names what is wrong. */
async function checker(name: string) {
  const { components } = await read();
  const validate = new Ajv2020({ strict: false, allErrors: true }).compile(components.schemas[name] ?? false);
  return (value: unknown) => (validate(value) ? [] : (validate.errors ?? []).map((error) => `${error.instancePath} ${error.message}`));
}

describe('/api/openapi.json', () => {
  it('is a valid OpenAPI 3.1 document', async () => {
    const document = await read();
    expect(document.openapi).toMatch(/^3\.1\./);
    expect(await new Validator().validate({ ...document })).toMatchObject({ valid: true });
  });

  it('describes every route that takes nobody for granted, and no other', async () => {
    const open = [...WITHOUT_SESSION].filter((name) => !name.includes('/bench/')).map((name) => name.replace(/^\w+/, (method) => method.toLowerCase()));
    const { paths } = await read();
    const described = Object.entries(paths).flatMap(([path, operations]) => Object.keys(operations).map((method) => `${method} ${path}`));
    expect(described.sort()).toEqual(open.sort());
  });

  it("holds the server's answers, field for field", async () => {
    const [program, lookup] = [await checker('Program'), await checker('Lookup')];
    const metric = { units: 'mm', length: 600, width: 9.5, depth: 4.8, stopMargin: 22, bitDiameter: 6, stepdown: 2.4 };
    const machine = { travel: { x: 32, y: 32, z: 4 }, topFeed: 200, acceleration: 20, spindleRange: [8000, 24000], heavy: false };
    for (const spec of [RAIL, metric, { ...RAIL, machine, chipLoadRange: [0.002, 0.004], spindle: 'hand', ends: 'round' }]) {
      const response = await post(spec);
      expect(response.status).toBe(200);
      const made = await response.json() as ProgramBody;
      expect(program(made)).toEqual([]);
      expect(lookup(await (await fetch(url(`/api/programs/${made.mark}`))).json())).toEqual([]);
    }
  });

  it("holds the server's problems", async () => {
    const problem = await checker('Problem');
    const { paths } = await read();
    const described = Object.keys(paths['/api/programs']?.post?.responses ?? {});
    const answers = [
      await post('{'), await post({}), await post(RAIL, { accept: 'image/png' }), await post(RAIL, { 'content-type': 'text/plain' }),
      await post(' '.repeat(70_000)), await post(NEEDS_A_PLUNGE),
    ];
    for (const response of answers) {
      expect(described).toContain(String(response.status));
      expect(problem(await response.json())).toEqual([]);
    }
    expect(new Set(answers.map(({ status }) => status))).toEqual(new Set([400, 422, 406, 415, 413, 500]));
  });

  it('describes the request as the server takes it: what it accepts passes, and shapes it refuses do not', async () => {
    const request = await checker('SlotRequest');
    expect(request(RAIL)).toEqual([]);
    expect(request({ ...RAIL, length: '24 1/2', machine: null, options: { lineNumbers: true } })).toEqual([]);
    const shapes = BAD_INPUTS.filter(({ what }) => /unknown|missing|as text|huge|empty object|misspelt/.test(what));
    expect(shapes.length).toBeGreaterThan(20);
    for (const { what, send } of shapes) {
      const body: unknown = JSON.parse(typeof send === 'string' ? send : JSON.stringify({ ...RAIL, ...send }));
      expect(request(body), what).not.toEqual([]);
    }
  });

  it('names every field of a spec and where its default comes from', async () => {
    const { components } = await read();
    const { properties } = components.schemas.SlotRequest as { properties: Record<string, { description?: string }> };
    const bare = Object.keys(properties).filter((field) => field !== 'options' && !properties[field]?.description);
    expect(bare).toEqual([]);
    expect(properties.railWidth?.description).toMatch(/3 × slot width/);
  });
});
