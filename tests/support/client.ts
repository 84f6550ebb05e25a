import { testPassword } from './factories';

export interface TestAnswer<Body = Record<string, unknown>> {
  status: number;
  headers: Headers;
  /** Parsed where the answer is JSON, else undefined. */
  body: Body;
  bytes: Buffer;
}

export interface TestClient {
  /** Null without a session. */
  cookie: string | null;
  /** `path` is below /api/v1, or whole where it begins with /api/ or is an address. A FormData or text body goes as it is, anything else as JSON. */
  request<Body = Record<string, unknown>>(method: string, path: string, body?: unknown, options?: { headers?: Record<string, string> }): Promise<TestAnswer<Body>>;
  get<Body = Record<string, unknown>>(path: string, options?: { headers?: Record<string, string> }): Promise<TestAnswer<Body>>;
  post<Body = Record<string, unknown>>(path: string, body?: unknown, options?: { headers?: Record<string, string> }): Promise<TestAnswer<Body>>;
}

const isJson = (type: string | null) => type !== null && /^application\/(problem\+)?json/.test(type);

/** Speaks to the application over HTTP, as a program would. */
export function createClient(url: string, cookie: string | null): TestClient {
  const client: TestClient = {
    cookie,
    async request<Body>(method: string, path: string, body?: unknown, options: { headers?: Record<string, string> } = {}) {
      const address = path.startsWith('http') ? path : `${url}${path.startsWith('/api/') ? '' : '/api/v1'}${path}`;
      const asItIs = body instanceof FormData || typeof body === 'string';
      const answer = await fetch(address, {
        method,
        redirect: 'manual',
        headers: {
          ...(cookie === null ? {} : { cookie }),
          ...(body === undefined || body instanceof FormData ? {} : { 'content-type': 'application/json' }),
          ...options.headers,
        },
        ...(body === undefined ? {} : { body: asItIs ? body : JSON.stringify(body) }),
      });
      const bytes = Buffer.from(await answer.arrayBuffer());
      const parsed: unknown = isJson(answer.headers.get('content-type')) && bytes.length > 0 ? JSON.parse(bytes.toString('utf8')) : undefined;
      return { status: answer.status, headers: answer.headers, body: parsed as Body, bytes };
    },
    get: (path, options) => client.request('GET', path, undefined, options),
    post: (path, body, options) => client.request('POST', path, body, options),
  };
  return client;
}

/** Signs in by mail address and password; answers the cookie header of the session. */
export async function signInCookie(url: string, email: string, password = testPassword): Promise<string> {
  const answer = await fetch(`${url}/api/auth/sign-in/email`, { method: 'POST', headers: { 'content-type': 'application/json', origin: url }, body: JSON.stringify({ email, password }) });
  if (answer.status !== 200) throw new Error(`Signing in as ${email} answered ${answer.status}: ${await answer.text()}`);
  return answer.headers.getSetCookie().map((line) => line.split(';')[0]).join('; ');
}
