import { inject } from 'vitest';

type Headers = Record<string, string>;

export interface UploadOptions {
  /** Content type of a bare body; default text/csv. Ignored when `asForm`. */
  type?: string;
  /** Sends the bytes as the field `file` of a form, as the browser does. */
  asForm?: boolean;
  name?: string;
  headers?: Headers;
}

export interface Client {
  baseUrl: string;
  /** The cookies held, by name. */
  cookies: ReadonlyMap<string, string>;
  request(path: string, init?: RequestInit): Promise<Response>;
  get(path: string, headers?: Headers): Promise<Response>;
  /** A string goes as it is, URLSearchParams as a form, any other object as JSON. */
  post(path: string, body?: string | URLSearchParams | object, headers?: Headers): Promise<Response>;
  upload(path: string, bytes: string | Uint8Array, options?: UploadOptions): Promise<Response>;
}

export interface ClientOptions {
  baseUrl?: string;
  token?: string;
}

/** A client that keeps cookies and follows no redirect, so that a test sees where it is sent. */
export function createClient({ baseUrl = inject('baseUrl'), token }: ClientOptions = {}): Client {
  const cookies = new Map<string, string>();
  const request = async (path: string, init: RequestInit = {}): Promise<Response> => {
    const headers = new Headers(init.headers);
    if (cookies.size > 0)
      headers.set('cookie', [...cookies].map(([name, value]) => `${name}=${value}`).join('; '));
    if (token && !headers.has('authorization')) headers.set('authorization', `Bearer ${token}`);
    const response = await fetch(new URL(path, baseUrl), { redirect: 'manual', ...init, headers });
    for (const line of response.headers.getSetCookie()) keepCookie(cookies, line);
    return response;
  };
  return {
    baseUrl,
    cookies,
    request,
    get: (path, headers) => request(path, { headers }),
    post: (path, body, headers) => request(path, { method: 'POST', ...bodyOf(body, headers) }),
    upload: (path, bytes, options) => request(path, { method: 'POST', ...uploadOf(bytes, options) }),
  };
}

function keepCookie(cookies: Map<string, string>, line: string): void {
  const [pair = '', ...attributes] = line.split(';');
  const at = pair.indexOf('=');
  const name = pair.slice(0, at).trim();
  const value = pair.slice(at + 1).trim();
  const isTakenBack = value === '' || attributes.some((attribute) => /^\s*max-age=0\s*$/i.test(attribute));
  if (isTakenBack) cookies.delete(name);
  else cookies.set(name, value);
}

function bodyOf(body: string | URLSearchParams | object | undefined, headers: Headers = {}): RequestInit {
  if (body === undefined || typeof body === 'string' || body instanceof URLSearchParams)
    return { body, headers };
  return { body: JSON.stringify(body), headers: { 'content-type': 'application/json', ...headers } };
}

function uploadOf(bytes: string | Uint8Array, options: UploadOptions = {}): RequestInit {
  const { type = 'text/csv', asForm = false, name = 'results.csv', headers = {} } = options;
  const body = typeof bytes === 'string' ? bytes : new Uint8Array(bytes);
  if (!asForm) return { body, headers: { 'content-type': type, ...headers } };
  const form = new FormData();
  form.set('file', new File([body], name, { type }));
  return { body: form, headers };
}

/** Signs in as the sign-in page does and returns a client that holds the session's cookie. */
export async function signIn(email: string, password: string, options: ClientOptions = {}): Promise<Client> {
  const client = createClient(options);
  const { csrfToken } = (await (await client.get('/api/auth/csrf')).json()) as { csrfToken: string };
  const form = new URLSearchParams({ csrfToken, email, password, json: 'true' });
  const response = await client.post('/api/auth/callback/credentials', form);
  const isSignedIn = [...client.cookies.keys()].some((name) => name.endsWith('next-auth.session-token'));
  if (!isSignedIn) throw new Error(`${email} could not sign in: ${response.status} ${await response.text()}`);
  return client;
}

/** Signs in the demonstration's first person with this role. */
export async function signInAs(role: string, options: ClientOptions = {}): Promise<Client> {
  const { email, password } = demoSignIn(role);
  return signIn(email, password, options);
}

export function demoSignIn(role: string): { name: string; email: string; password: string } {
  const found = inject('demo').signIns.find((entry) => entry.role === role);
  if (!found) throw new Error(`the demonstration has no sign-in with the role ${role}`);
  return found;
}
