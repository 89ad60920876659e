import type { Express } from 'express';
import supertest from 'supertest';

type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';

/** A browser as the server sees one: it keeps cookies and sends the XSRF cookie back in its header, as Angular's client does. */
export class Browser {
  readonly agent: ReturnType<typeof supertest.agent>;

  constructor(express: Express) {
    this.agent = supertest.agent(express);
  }

  /** Asks with the XSRF proof this browser holds; opens the page first when it holds none. */
  async ask(method: Method, path: string, body?: object): Promise<supertest.Response> {
    if (method !== 'get' && !this.cookie('XSRF-TOKEN')) await this.agent.get('/api/me');
    return this.prepare(method, path, body);
  }

  /** The request unsent, for tests that attach a file or change a header. Ask for a page first, so that there is a proof to send. */
  prepare(method: Method, path: string, body?: object): supertest.Test {
    const request = this.agent[method](path).set('X-XSRF-TOKEN', this.cookie('XSRF-TOKEN') ?? '');
    return body ? request.send(body) : request;
  }

  /** The value of a cookie this browser holds. */
  cookie(name: string): string | undefined {
    return this.agent.jar.getCookie(name, { domain: '127.0.0.1', path: '/', secure: false, script: false })?.value;
  }
}
