/** A browser or a script, as the API sees it: keeps cookies, sends the forgery token, reads any answer. */

export interface Answer {
  readonly status: number;
  readonly headers: Headers;
  /** Parsed JSON, or null for an answer without a JSON body. */
  readonly json: unknown;
  readonly bytes: Buffer;
}

export interface Call {
  readonly body?: unknown;
  /** Sent as it is, instead of `body`. */
  readonly raw?: { readonly type: string; readonly content: string | Uint8Array };
  readonly form?: FormData;
  readonly ifMatch?: string;
  readonly headers?: Readonly<Record<string, string>>;
}

interface Cookie {
  readonly value: string;
  readonly path: string;
}

export class ApiClient {
  readonly cookies = new Map<string, Cookie>();
  /** Switched off to see what happens to a request that a foreign page sent. */
  sendsForgeryToken = true;

  constructor(
    readonly url: string,
    private readonly bearer: string | null = null,
  ) {}

  get = (path: string, call?: Call): Promise<Answer> => this.send('GET', path, call);
  post = (path: string, body?: unknown, call?: Call): Promise<Answer> => this.send('POST', path, { body, ...call });
  put = (path: string, body?: unknown, call?: Call): Promise<Answer> => this.send('PUT', path, { body, ...call });
  patch = (path: string, body?: unknown, call?: Call): Promise<Answer> => this.send('PATCH', path, { body, ...call });
  delete = (path: string, call?: Call): Promise<Answer> => this.send('DELETE', path, call);

  async send(method: string, path: string, call: Call = {}): Promise<Answer> {
    const headers: Record<string, string> = { ...this.ownHeaders(path) };
    if (call.ifMatch !== undefined) headers['if-match'] = call.ifMatch;
    let body: BodyInit | undefined = call.form;
    if (call.raw !== undefined) {
      headers['content-type'] = call.raw.type;
      body = typeof call.raw.content === 'string' ? call.raw.content : new Uint8Array(call.raw.content);
    } else if (call.body !== undefined) {
      headers['content-type'] = 'application/json';
      body = JSON.stringify(call.body);
    }
    const response = await fetch(`${this.url}${path}`, { method, headers: { ...headers, ...call.headers }, body, redirect: 'manual' });
    this.keepCookies(response.headers.getSetCookie());
    const bytes = Buffer.from(await response.arrayBuffer());
    const isJson = /json/.test(response.headers.get('content-type') ?? '') && bytes.length > 0;
    return { status: response.status, headers: response.headers, bytes, json: isJson ? (JSON.parse(bytes.toString('utf8')) as unknown) : null };
  }

  cookie(name: string): string | undefined {
    return this.cookies.get(name)?.value;
  }

  private ownHeaders(path: string): Record<string, string> {
    if (this.bearer !== null) return { authorization: `Bearer ${this.bearer}` };
    const sent = [...this.cookies].filter(([, cookie]) => path === cookie.path || path.startsWith(cookie.path === '/' ? '/' : `${cookie.path}/`));
    const forgery = this.sendsForgeryToken ? this.cookies.get('XSRF-TOKEN')?.value : undefined;
    return {
      ...(sent.length > 0 ? { cookie: sent.map(([name, { value }]) => `${name}=${value}`).join('; ') } : {}),
      ...(forgery === undefined ? {} : { 'x-xsrf-token': forgery }),
    };
  }

  private keepCookies(lines: readonly string[]): void {
    for (const line of lines) {
      const [pair = '', ...attributes] = line.split(/;\s*/);
      const equals = pair.indexOf('=');
      const name = pair.slice(0, equals);
      const value = decodeURIComponent(pair.slice(equals + 1));
      const path = attributes.find((attribute) => attribute.startsWith('Path='))?.slice(5) ?? '/';
      if (attributes.some((attribute) => attribute.startsWith('Expires=Thu, 01 Jan 1970'))) this.cookies.delete(name);
      else this.cookies.set(name, { value, path });
    }
  }
}
