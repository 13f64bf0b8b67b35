import { describe, expect, it } from 'vitest';
import { BAD_INPUTS } from './badInputs';
import { RAIL, post, problemOf } from './support';

describe('bad input', () => {
  it('is tried in a hundred ways, each once', () => {
    expect(BAD_INPUTS.length).toBeGreaterThanOrEqual(100);
    expect(new Set(BAD_INPUTS.map((input) => input.what)).size).toBe(BAD_INPUTS.length);
  });

  it('starts from a spec that is good', async () => {
    expect((await post(RAIL)).status).toBe(200);
  });

  it.each(BAD_INPUTS)('$what: 422 that names it', async ({ send, paths }) => {
    const response = await post(typeof send === 'string' ? send : { ...RAIL, ...send });
    const { status, errors = [] } = await problemOf(response);
    expect(status).toBe(422);
    expect(errors.map((error) => error.path)).toEqual(expect.arrayContaining([...paths]));
    expect(errors.length).toBeGreaterThan(0);
    for (const { message } of errors) {
      // A sentence that a person can act on: it never quotes more than a line, nor the validator's own words.
      expect(message).toMatch(/^[A-Z"].*[.?]$/);
      expect(message.length).toBeLessThan(240);
      expect(message).not.toMatch(/^Invalid|expected|Unrecognized|\[object/);
    }
  });
});
