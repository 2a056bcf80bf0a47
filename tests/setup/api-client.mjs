// A person at the JSON endpoints: signs in as a browser would, keeps cookies, sends Origin. Node built-ins only, so that
// the proof of `npm start` can use it in a clone that has only just been installed.

export class ApiClient {
  #cookies = new Map();

  /** @param {string} base such as http://localhost:4380 */
  constructor(base) {
    this.base = base;
  }

  async #fetch(path, init = {}) {
    const headers = new Headers(init.headers);
    headers.set('origin', this.base);
    if (this.#cookies.size > 0)
      headers.set('cookie', [...this.#cookies].map(([name, value]) => `${name}=${value}`).join('; '));
    const response = await fetch(new URL(path, this.base), { ...init, headers, redirect: 'manual' });
    for (const line of response.headers.getSetCookie()) {
      const [pair] = line.split(';');
      const cut = pair.indexOf('=');
      const value = pair.slice(cut + 1);
      if (value === '') this.#cookies.delete(pair.slice(0, cut));
      else this.#cookies.set(pair.slice(0, cut), value);
    }
    return response;
  }

  async signIn(email, password) {
    const { csrfToken } = await (await this.#fetch('/api/auth/csrf')).json();
    await this.#fetch('/api/auth/callback/credentials', {
      method: 'POST',
      headers: { 'content-type': 'application/x-www-form-urlencoded', 'x-auth-return-redirect': '1' },
      body: new URLSearchParams({ csrfToken, email, password, callbackUrl: this.base }),
    });
    const { person } = await this.get('/api/account');
    if (person?.email !== email) throw new Error(`could not sign in as ${email}`);
    return person;
  }

  /** The raw response of any request. */
  raw(path, init) {
    return this.#fetch(path, init);
  }

  async #json(response, what) {
    const text = await response.text();
    if (!response.ok) throw new Error(`${what} answered ${response.status}: ${text.slice(0, 400)}`);
    return JSON.parse(text);
  }

  async get(path) {
    return this.#json(await this.#fetch(path), `GET ${path}`);
  }

  async send(method, path, body) {
    const headers = { 'content-type': 'application/json' };
    return this.#json(
      await this.#fetch(path, { method, headers, body: JSON.stringify(body) }),
      `${method} ${path}`,
    );
  }

  async upload(path, fileName, bytes, mediaType) {
    const form = new FormData();
    form.set('artwork', new File([bytes], fileName, { type: mediaType }));
    return this.#json(await this.#fetch(path, { method: 'POST', body: form }), `POST ${path}`);
  }

  async download(path) {
    const response = await this.#fetch(path);
    if (!response.ok) throw new Error(`GET ${path} answered ${response.status}`);
    return new Uint8Array(await response.arrayBuffer());
  }

  /** Fetches an order again until a condition holds. */
  async orderWhen(number, condition, what, seconds = 60) {
    const until = Date.now() + seconds * 1000;
    for (;;) {
      const { order } = await this.get(`/api/orders/${number}`);
      if (condition(order)) return order;
      if (Date.now() > until) {
        throw new Error(
          `${what} did not happen within ${seconds} s; the order is ${order.state}: ${JSON.stringify(order.artworks.at(-1)?.task)}`,
        );
      }
      await new Promise((done) => setTimeout(done, 200));
    }
  }
}
