import { DrizzleQueryError } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import express from 'express';
import request from 'supertest';
import { createLogger, requestLogger } from '../../server/logger';

function capture() {
  const lines: string[] = [];
  const logger = createLogger('info', { write: (line: string) => void lines.push(line) });
  return { logger, lines, parsed: () => lines.map((line) => JSON.parse(line) as Record<string, unknown>) };
}

describe('logs', () => {
  it('are one JSON object a line with a time', () => {
    const { logger, parsed } = capture();
    logger.info({ submission: 7 }, 'submitted');
    expect(parsed()).toMatchObject([{ submission: 7, msg: 'submitted', level: 30 }]);
    expect(Number.isNaN(Date.parse(String(parsed()[0]?.['time'])))).toBe(false);
  });

  it.each(['password', 'newPassword', 'token', 'secret', 'authorization', 'cookie', 'set-cookie', 'x-api-key', 'apiKey'])('hold no %s, at no depth', (name) => {
    const { logger, lines } = capture();
    logger.info({ [name]: 'hidden-1', a: { [name]: 'hidden-2', b: { [name]: 'hidden-3', c: { [name]: 'hidden-4' } } } });
    expect(lines).toHaveLength(1);
    expect(lines.join('')).not.toContain('hidden');
  });

  it('hold no mail address, even inside the text of an error', () => {
    const { logger, lines } = capture();
    logger.error({ err: new Error('Key (email)=(first.last+x@lab.example.org) already exists') }, 'to someone@demo.example');
    expect(lines.join('')).not.toContain('example');
    expect(lines.join('')).not.toContain('first.last');
    expect(lines.join('')).toContain('already exists');
  });

  it('name the cause of a failed query without its parameters', () => {
    const { logger, lines } = capture();
    const cause = Object.assign(new Error('duplicate key value'), { code: '23505' });
    logger.error({ err: new DrizzleQueryError('insert into sessions values ($1, $2)', ['hidden-1', 'hidden-2'], cause) });
    expect(lines.join('')).not.toContain('hidden');
    expect(JSON.parse(lines.join(''))).toMatchObject({ err: { message: 'Failed query: insert into sessions values ($1, $2)', cause: { message: 'duplicate key value', code: '23505' } } });
  });

  it('hold no token of an address', () => {
    const { logger, lines } = capture();
    logger.info('opened http://127.0.0.1:4680/verify?token=abc.def-123&next=/');
    expect(lines.join('')).not.toContain('abc.def');
  });
});

describe('a request', () => {
  it('gets an id that stands in its answer and in its line, without query, cookie or key', async () => {
    const { logger, parsed, lines } = capture();
    const app = express();
    app.use(requestLogger(logger));
    app.get('/api/v1/species', (_request, response) => void response.json({}));
    const answer = await request(app).get('/api/v1/species?query=hidden').set('Cookie', 'session=hidden').set('x-api-key', 'hidden');
    expect(parsed()).toMatchObject([{ req: { id: answer.headers['x-request-id'], method: 'GET', path: '/api/v1/species' }, res: { statusCode: 200 } }]);
    expect(lines.join('')).not.toContain('hidden');
  });

  it('keeps an id that it brings when that is a plain one, and only then', async () => {
    const app = express();
    app.use(requestLogger(capture().logger));
    app.get('/', (_request, response) => void response.end());
    expect((await request(app).get('/').set('X-Request-Id', 'trace-12345678')).headers['x-request-id']).toBe('trace-12345678');
    expect((await request(app).get('/').set('X-Request-Id', 'a"b{}')).headers['x-request-id']).toMatch(/^[0-9a-f-]{36}$/);
  });
});
