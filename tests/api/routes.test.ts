import { describe, expect, it } from 'vitest';
import { RAIL, post, problemOf, url } from './support';

describe('routes under /api', () => {
  it.each(['/api', '/api/', '/api/nothing', '/api/programs/K74-QDM/text', '/api/openapi.jsonx', '/api/PROGRAMS', '/api?x=1', '/api/bench/empty'])('%s is not there', async (path) => {
    for (const method of ['GET', 'POST', 'DELETE']) {
      const { status } = await problemOf(await fetch(url(path), { method }));
      expect([404, 405], `${method} ${path}`).toContain(status);
    }
  });

  it.each([
    ['/api/programs', ['GET', 'PUT', 'PATCH', 'DELETE'], 'OPTIONS, POST'],
    ['/api/programs/K74-QDM', ['POST', 'PUT', 'PATCH', 'DELETE'], 'GET, HEAD, OPTIONS'],
    ['/api/openapi.json', ['POST', 'DELETE'], 'GET, HEAD, OPTIONS'],
  ])('%s tells a wrong method the right ones', async (path, methods, allow) => {
    for (const method of methods) {
      const response = await fetch(url(path), { method });
      expect((await problemOf(response)).status, method).toBe(405);
      expect(response.headers.get('allow')).toBe(allow);
    }
    const options = await fetch(url(path), { method: 'OPTIONS' });
    expect([options.status, options.headers.get('allow'), await options.text()]).toEqual([204, allow, '']);
    expect(options.headers.get('access-control-allow-origin')).toBeNull();
  });

  it('answers HEAD as GET without the body', async () => {
    const [get, head] = [await fetch(url('/api/openapi.json')), await fetch(url('/api/openapi.json'), { method: 'HEAD' })];
    expect(head.status).toBe(200);
    expect(head.headers.get('content-type')).toBe(get.headers.get('content-type'));
    expect(await head.text()).toBe('');
  });

  it.each(['image/png', 'text/html', 'application/json;q=0, text/plain;q=0', 'application/problem+json'])('cannot be sent as %s', async (accept) => {
    const response = await post(RAIL, { accept });
    const { status, detail } = await problemOf(response);
    expect(status).toBe(406);
    expect(detail).toContain('application/json or text/plain');
    expect(response.headers.get('vary')).toBe('Accept');
  });

  it('is the same with a slash at the end', async () => {
    expect((await post(RAIL, {}, url('/api/programs/'))).status).toBe(200);
  });
});
