import { request as httpRequest } from 'node:http';
import { connect } from 'node:net';
import { gzipSync } from 'node:zlib';
import { describe, expect, inject, it } from 'vitest';
import { RAIL, post, problemOf, url } from './support';

const KB = 1024;
/** The good rail, padded with blanks to an exact number of bytes. */
const padded = (bytes: number) => JSON.stringify(RAIL).padEnd(bytes, ' ');

/** Sends bytes in chunks without saying how many there will be. */
function postChunked(chunk: string, times: number): Promise<{ status: number; body: string }> {
  return new Promise((resolve, reject) => {
    const request = httpRequest(url('/api/programs'), { method: 'POST', headers: { 'content-type': 'application/json' } }, (response) => {
      let body = '';
      response.setEncoding('utf8').on('data', (text: string) => (body += text)).on('end', () => resolve({ status: response.statusCode ?? 0, body }));
    });
    request.once('error', reject);
    for (let i = 0; i < times; i++) request.write(chunk);
    request.end();
  });
}

describe('the body', () => {
  it('may have 64 kB and not a byte more', async () => {
    expect((await post(padded(64 * KB))).status).toBe(200);
    expect((await problemOf(await post(padded(64 * KB + 1)))).status).toBe(413);
    expect((await problemOf(await post(padded(900 * KB)))).status).toBe(413);
  });

  it('is refused unread where its announced length is far too much', async () => {
    const { hostname, port } = new URL(inject('baseUrl'));
    const answer = await new Promise<string>((resolve, reject) => {
      const socket = connect(Number(port), hostname, () => {
        socket.write('POST /api/programs HTTP/1.1\r\nHost: x\r\nContent-Type: application/json\r\nContent-Length: 1000000000000\r\n\r\n{');
      });
      let text = '';
      socket.setEncoding('utf8').on('data', (part: string) => (text += part)).once('close', () => resolve(text)).once('error', reject);
    });
    expect(answer).toMatch(/^HTTP\/1\.1 413 /);
    expect(answer).toMatch(/connection: close/i);
  });

  it('is held to the same limit where it comes in chunks', async () => {
    expect((await postChunked(padded(KB), 1)).status).toBe(200);
    expect(await postChunked(' '.repeat(8 * KB), 12)).toMatchObject({ status: 413, body: expect.stringContaining('64 kB') as string });
  });

  it('has to be JSON', async () => {
    const bad = ['', ' ', '{', '{"units":"in",}', "{'units':'in'}", 'undefined', 'NaN', '{"length":NaN}', '{"length":Infinity}', '{"length":01}', `${JSON.stringify(RAIL)}x`, 'units=in', '\u0000'];
    for (const body of bad) {
      const { status, detail } = await problemOf(await post(body));
      expect(status, body).toBe(400);
      expect(detail).toMatch(/JSON/);
    }
  });

  it('has to be UTF-8', async () => {
    const body = Buffer.concat([Buffer.from('{"name":"'), Buffer.from([0xc3, 0x28]), Buffer.from('"}')]);
    const response = await fetch(url('/api/programs'), { method: 'POST', headers: { 'content-type': 'application/json' }, body });
    expect((await problemOf(response)).status).toBe(400);
  });

  it('has to say that it is JSON', async () => {
    const types = ['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data; boundary=x', 'application/json; charset=latin1', 'application/jsonp', ''];
    for (const type of types) expect((await problemOf(await post(RAIL, { 'content-type': type }))).status, type).toBe(415);
    const bare = await fetch(url('/api/programs'), { method: 'POST', body: new Uint8Array(Buffer.from(JSON.stringify(RAIL))) });
    expect((await problemOf(bare)).status).toBe(415);
  });

  it('is not unpacked', async () => {
    const body = gzipSync(JSON.stringify(RAIL));
    const response = await fetch(url('/api/programs'), { method: 'POST', headers: { 'content-type': 'application/json', 'content-encoding': 'gzip' }, body });
    expect((await problemOf(response)).status).toBe(415);
    expect(response.headers.get('accept-encoding')).toBe('identity');
  });

  it('that breaks off leaves the server answering', async () => {
    const { hostname, port } = new URL(inject('baseUrl'));
    await new Promise<void>((resolve, reject) => {
      const socket = connect(Number(port), hostname, () => {
        socket.write('POST /api/programs HTTP/1.1\r\nHost: x\r\nContent-Type: application/json\r\nContent-Length: 500\r\n\r\n{"units"', () => socket.destroy());
      });
      socket.once('close', () => resolve()).once('error', reject);
    });
    expect((await post(RAIL)).status).toBe(200);
  });

  it('with thousands of wrong keys is answered in short', async () => {
    const body = Object.fromEntries(Array.from({ length: 4000 }, (_, i) => [`key${i}`, i]));
    const response = await post(body);
    const { status, errors = [] } = await problemOf(response.clone());
    expect(status).toBe(422);
    expect(errors.length).toBeLessThanOrEqual(100);
    expect((await response.text()).length).toBeLessThan(32 * KB);
  });
});
