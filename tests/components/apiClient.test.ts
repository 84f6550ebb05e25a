import { afterEach, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { api, queryString } from '../../components/api/client';
import { ApiError, isPassing, type ApiProblem } from '../../components/api/problem';

const schema = z.object({ name: z.string() });

function answerWith(body: unknown, status = 200) {
  vi.stubGlobal('fetch', vi.fn(async () => new Response(JSON.stringify(body), { status })));
}

async function problemOf(work: Promise<unknown>): Promise<ApiProblem> {
  try {
    await work;
  } catch (error) {
    if (error instanceof ApiError) return error.problem;
    throw error;
  }
  throw new Error('the request did not fail');
}

afterEach(() => vi.unstubAllGlobals());

describe('the API client', () => {
  it('parses an answer with its contract', async () => {
    answerWith({ name: 'Porto', more: 1 });
    expect(await api.get('/me', schema)).toEqual({ name: 'Porto' });
  });

  it('hands on what the server says is wrong, code and fields', async () => {
    answerWith({ type: 'about:blank', title: 'The input is not valid', status: 400, code: 'invalid-input', detail: 'One field.', errors: [{ path: 'name', message: 'Say a name.' }], requestId: 'r1' }, 400);
    const problem = await problemOf(api.send('POST', '/labs', {}, schema));
    expect(problem).toMatchObject({ kind: 'problem', status: 400, code: 'invalid-input', errors: [{ path: 'name', message: 'Say a name.' }] });
  });

  it('does not take an answer that breaks the contract', async () => {
    vi.spyOn(console, 'error').mockImplementation(() => {});
    answerWith({ name: 7 });
    expect(await problemOf(api.get('/me', schema))).toMatchObject({ kind: 'invalid-answer' });
  });

  it('tells a missing network apart, as something that may pass', async () => {
    vi.stubGlobal('fetch', vi.fn(async () => Promise.reject(new TypeError('Failed to fetch'))));
    const problem = await problemOf(api.get('/me', schema));
    expect(problem).toEqual({ kind: 'network' });
    expect(isPassing(new ApiError(problem))).toBe(true);
    expect(isPassing(new ApiError({ kind: 'problem', status: 403, code: 'not-allowed', title: '', detail: '', errors: [], requestId: '' }))).toBe(false);
  });

  it('leaves what is not set out of a query', () => {
    expect(queryString({ clades: ['primates', 'rodentia'], method: '', level: 0.95, version: null, x: undefined, y: [] })).toBe('?clades=primates%2Crodentia&level=0.95');
    expect(queryString({})).toBe('');
  });
});
