import { createServer, request as httpRequest, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import * as settings from '@/lib/server/config';
import { markSocketAddress, socketAddress } from '@/lib/server/http/socket-address';

const with_ = (forwarded: string | null, socket: string | null): Request => {
  const headers = new Headers();
  if (forwarded !== null) headers.set('x-forwarded-for', forwarded);
  if (socket !== null) markSocketAddress(headers, socket);
  return new Request('http://localhost/', { headers });
};
const trust = (...trustedProxies: string[]) => {
  vi.spyOn(settings, 'config').mockReturnValue({ ...settings.readConfig({}), trustedProxies });
};
afterEach(() => vi.restoreAllMocks());

describe('socketAddress', () => {
  it('is the socket’s own, whatever the client says', () => {
    expect(socketAddress(with_('203.0.113.9', '198.51.100.7'))).toBe('198.51.100.7');
    expect(socketAddress(with_(null, '::ffff:198.51.100.7'))).toBe('198.51.100.7');
  });

  it('is unknown without a socket, and never what the client says', () => {
    expect(socketAddress(with_('203.0.113.9', null))).toBe('unknown');
  });

  it('believes a proxy that the settings name: the last address that is no such proxy', () => {
    trust('10.0.0.1', '10.0.0.2');
    expect(socketAddress(with_('6.6.6.6, 203.0.113.9, 10.0.0.2', '10.0.0.1'))).toBe('203.0.113.9');
    expect(socketAddress(with_(null, '10.0.0.1'))).toBe('10.0.0.1');
    expect(socketAddress(with_('6.6.6.6', '10.0.0.9'))).toBe('10.0.0.9');
  });
});

describe('on a real connection', () => {
  let server: Server;
  let port: number;
  beforeAll(async () => {
    server = createServer((incoming, answer) => {
      const headers = new Headers(
        Object.entries(incoming.headers).map(([name, value]): [string, string] => [name, String(value)]),
      );
      answer.end(socketAddress(new Request('http://localhost/', { headers })));
    });
    await new Promise<void>((done) => server.listen(0, '127.0.0.1', done));
    port = (server.address() as AddressInfo).port;
  });
  afterAll(() => new Promise((done) => server.close(done)));

  it('the listener writes the address before anything else sees the request', async () => {
    const text = await new Promise((resolve, reject) => {
      const sent = httpRequest(
        { port, host: '127.0.0.1', headers: { 'x-forwarded-for': '6.6.6.6' } },
        (response) => {
          response.setEncoding('utf8').on('data', resolve);
        },
      );
      sent.on('error', reject).end();
    });
    expect(text).toBe('127.0.0.1');
  });
});
