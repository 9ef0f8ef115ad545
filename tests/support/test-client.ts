import type { Server } from 'node:http';

import request, { type Test } from 'supertest';

type Verb = 'get' | 'post' | 'put' | 'delete' | 'patch';

/** A browser in a test: keeps cookies, sends the CSRF token and its own origin with changes. */
export class TestClient {
  readonly #agent: ReturnType<typeof request.agent>;
  readonly #origin: string;

  constructor(server: Server) {
    const address = server.address();
    const port = typeof address === 'object' && address !== null ? address.port : 0;
    this.#agent = request.agent(server);
    this.#origin = `http://127.0.0.1:${port}`;
  }

  get(path: string): Test {
    return this.#agent.get(path);
  }

  post(path: string, body?: object, version?: number): Test {
    return this.#change('post', path, { body, version });
  }

  put(path: string, body?: object, version?: number): Test {
    return this.#change('put', path, { body, version });
  }

  delete(path: string, version?: number): Test {
    return this.#change('delete', path, { version });
  }

  /** The request as it is, cookies only: for tests of what must be refused. */
  bare(verb: Verb, path: string): Test {
    return this.#agent[verb](path);
  }

  get csrfToken(): string | undefined {
    return this.cookie('XSRF-TOKEN');
  }

  cookie(name: string): string | undefined {
    const access = { domain: '127.0.0.1', path: '/', secure: false, script: false };
    return this.#agent.jar.getCookie(name, access as never)?.value;
  }

  #change(
    verb: Verb,
    path: string,
    { body, version }: { body?: object | undefined; version?: number | undefined },
  ): Test {
    const test = this.#agent
      [verb](path)
      .set('Origin', this.#origin)
      .set('X-XSRF-TOKEN', this.csrfToken ?? '');
    if (version !== undefined) test.set('If-Match', `"${version}"`);
    return body === undefined ? test : test.send(body);
  }
}
