import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { expectSoundCut } from '../support/soundCut';
import { type ProgramBody, RAIL, post } from './support';

const json = async (response: Response) => await response.json() as ProgramBody;
const sha256 = (bytes: Uint8Array | string) => createHash('sha256').update(bytes).digest('hex');

describe('POST /api/programs', () => {
  it('answers JSON unless asked otherwise', async () => {
    for (const accept of ['*/*', 'application/json', 'application/*', 'text/plain;q=0.5, application/json', 'text/html, */*;q=0.1']) {
      const response = await post(RAIL, { accept });
      expect(response.status, accept).toBe(200);
      expect(response.headers.get('content-type'), accept).toBe('application/json');
      expect(response.headers.get('vary')).toBe('Accept');
      expect(response.headers.get('cache-control')).toBe('no-store');
    }
  });

  it('has exactly the fields of the contract', async () => {
    const answer = await json(await post(RAIL));
    expect(Object.keys(answer)).toEqual(['program', 'fileName', 'mark', 'sha256', 'spec', 'summary', 'readback']);
    expect(answer.sha256).toBe(sha256(answer.program));
    expect(answer.spec).toMatchObject(RAIL);
    expect(answer.fileName).toContain(answer.mark);
    expectSoundCut(answer.program, RAIL);
  });

  it('answers text/plain with the same bytes as a file to save', async () => {
    const answer = await json(await post(RAIL));
    for (const accept of ['text/plain', 'text/*', 'application/json;q=0.2, text/plain;q=0.9']) {
      const response = await post(RAIL, { accept });
      expect(response.headers.get('content-type')).toBe('text/plain; charset=utf-8');
      expect(response.headers.get('content-disposition')).toBe(`attachment; filename="${answer.fileName}"`);
      expect(response.headers.get('program-mark')).toBe(answer.mark);
      expect(response.headers.get('vary')).toBe('Accept');
      const bytes = new Uint8Array(await response.arrayBuffer());
      expect(sha256(bytes)).toBe(answer.sha256);
      expect(response.headers.get('content-length')).toBe(String(bytes.length));
    }
  });

  it('gives the same program for the same slot, however its sizes are written', async () => {
    const written = { ...RAIL, length: '24-1/2"', width: '3/8', depth: '.1875', stopMargin: '7/8 in', bitDiameter: '6.35 mm', stepdown: '3/32' };
    const [plain, asWritten] = [await json(await post(RAIL)), await json(await post(written))];
    expect(asWritten.program).toBe(plain.program);
    expect(asWritten.sha256).toBe(plain.sha256);
  });

  it('takes a charset and a byte order mark, and no other type', async () => {
    const response = await post(`\uFEFF${JSON.stringify(RAIL)}`, { 'content-type': 'Application/JSON; charset="UTF-8"' });
    expect(response.status).toBe(200);
  });

  it('writes what the options ask for', async () => {
    const { program } = await json(await post({ ...RAIL, options: { lineEndings: 'crlf', end: 'M2', fileEnding: 'tap', percent: false } }));
    expect(program).toMatch(/\r\nM2\r\n$/);
    expect(program.replaceAll('\r\n', '')).not.toContain('\n');
    expect(program).not.toContain('%');
  });

  it('lets no name out of its header, its comment or its file name', async () => {
    const names = ['x".nc\\', 'a) G0 Z-9 (', '../../etc', "Ines Okafor-Lindqvist's", 'naïve ☃ rail', ';%#[]', '   '];
    for (const name of names) {
      const response = await post({ ...RAIL, name }, { accept: 'text/plain' });
      expect(response.status, name).toBe(200);
      expect(response.headers.get('content-disposition'), name).toMatch(/^attachment; filename="[\w.-]+\.nc"$/);
      expectSoundCut(await response.text(), RAIL);
    }
  });
});
