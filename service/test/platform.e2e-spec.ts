import { problem } from '@tailrace/shared/contracts/problems';
import { connect } from 'node:net';
import { aService, type Service } from './a-service.js';

describe('the service', () => {
  let service: Service;
  beforeAll(async () => {
    service = await aService();
  });
  afterAll(() => service.close());

  const get = (path: string) => service.send('GET', path);

  it('says that it is up', async () => {
    expect((await get('/api/health').expect(200)).body).toEqual({ state: 'up' });
  });

  it('answers every refusal as problem details with the request’s id', async () => {
    const refused = await get('/api/nothing-here').expect(404);
    expect(refused.type).toBe('application/problem+json');
    const { instance, detail } = problem.parse(refused.body);
    expect(instance).toBe(refused.get('X-Request-Id'));
    expect(detail).toContain('/api/docs');
  });

  it('explains a body that is not JSON, and one that is too large', async () => {
    const post = (body: string) =>
      service.send('POST', '/api/session').set('Content-Type', 'application/json').send(body);
    const broken = await post('{"email":').expect(400);
    expect(problem.parse(broken.body).detail).toContain('not valid JSON');
    const large = await post(JSON.stringify({ email: 'x'.repeat(2_000_000) })).expect(413);
    expect(problem.parse(large.body).detail).toContain('1 MB');
  });

  it('survives addresses and methods no browser sends', async () => {
    await get('/api/valves/%E0%A4%A').expect(400);
    await get('/api/..%2f..%2fetc/passwd').expect(404);
    await service.send('PATCH', '/api/valves').expect(404);
    await service.send('TRACE', '/api/valves').expect(404);
    const raw = await speak(service.url, 'NONSENSE\r\n\r\n');
    expect(raw).toContain('400');
    await get('/api/health').expect(200);
  });

  it('gives a large file on a slow line hours, but a request that never gets to its body a minute', () => {
    const { requestTimeout, headersTimeout } = service.app.getHttpServer();
    expect(requestTimeout).toBeGreaterThan(3_600_000);
    expect(headersTimeout).toBeLessThanOrEqual(60_000);
  });

  it('opens a deep link of the dashboard with a page no cache keeps', async () => {
    const page = await get('/valves/FV-101?window=30d').expect(200);
    expect(page.type).toBe('text/html');
    expect(page.get('Cache-Control')).toBe('no-cache');
    expect(page.text).toContain('<div id="root">');
  });

  it('lets caches keep files with a hash in their name for a year', async () => {
    const page = await get('/').expect(200);
    const script = /src="(\/assets\/[^"]+\.js)"/.exec(page.text)?.[1] ?? '';
    const file = await get(script).set('Accept-Encoding', 'gzip').expect(200);
    expect(file.get('Cache-Control')).toBe('public, max-age=31536000, immutable');
    expect(file.get('Content-Encoding')).toBe('gzip');
  });

  it('never answers the page where a file or an API address is missing', async () => {
    for (const path of ['/assets/gone.js', '/api', '/api/', '/api/gone']) {
      const refused = await get(path).expect(404);
      expect(refused.type).toBe('application/problem+json');
    }
  });

  it('allows scripts of its own only, and no frame around it', async () => {
    const policy = (await get('/').expect(200)).get('Content-Security-Policy') ?? '';
    expect(policy).toContain("script-src 'self';");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy).not.toContain('unsafe-eval');
  });

  it('describes each route with what it takes and what it answers', async () => {
    await get('/api/docs').expect(200);
    const { paths } = (await get('/api/docs-json').expect(200)).body as {
      paths: Record<string, Record<string, { responses: Record<string, { content?: object }> }>>;
    };
    expect(Object.keys(paths)).toEqual(expect.arrayContaining(['/api/valves', '/api/ranking', '/api/runs']));
    const undescribed = Object.entries(paths).flatMap(([path, methods]) =>
      Object.entries(methods)
        .filter(([, { responses }]) => !Object.entries(responses).some(([s, r]) => s === '204' || r.content))
        .map(([method]) => `${method} ${path}`),
    );
    expect(undescribed).toEqual([]);
  });
});

/** Sends bytes as they are and gives back what comes. */
function speak(url: string, bytes: string): Promise<string> {
  const { hostname, port } = new URL(url);
  return new Promise((resolve, reject) => {
    let heard = '';
    const socket = connect(Number(port), hostname, () => socket.write(bytes));
    socket.on('data', (chunk) => (heard += chunk.toString()));
    socket.on('close', () => resolve(heard));
    socket.on('error', reject);
  });
}
