import { randomBytes } from 'node:crypto';
import { channel } from 'node:diagnostics_channel';
import type { IncomingMessage } from 'node:http';
import type { Socket } from 'node:net';
import { config } from '../config';

// The adapter believes any client's X-Forwarded-For and keeps the socket to itself, so the socket's address is written
// into the request before the adapter sees it, under a name that no client can guess.
const slot = globalThis as typeof globalThis & { umberlineSocketHeader?: string };

function socketHeader(): string {
  if (slot.umberlineSocketHeader) return slot.umberlineSocketHeader;
  const header = `x-socket-${randomBytes(12).toString('hex')}`;
  channel('http.server.request.start').subscribe((message) => {
    const { request, socket } = message as { request: IncomingMessage; socket: Socket };
    if (socket.remoteAddress) request.headers[header] = socket.remoteAddress;
  });
  return (slot.umberlineSocketHeader = header);
}
socketHeader();

const plain = (address: string): string => address.trim().replace(/^::ffff:/, '');

/**
 * The address that a request came from: the socket's own, or, when that is a proxy that the settings name, the last one
 * in X-Forwarded-For that is no such proxy.
 */
export function socketAddress(request: Request): string {
  const direct = plain(request.headers.get(socketHeader()) ?? 'unknown');
  const proxies = config().trustedProxies.map(plain);
  if (!proxies.includes(direct)) return direct;
  const forwarded = (request.headers.get('x-forwarded-for') ?? '').split(',').map(plain).filter(Boolean);
  return forwarded.reverse().find((address) => !proxies.includes(address)) ?? direct;
}

/** Marks a request as coming from an address, as the server's own listener does. */
export function markSocketAddress(headers: Headers, address: string): void {
  headers.set(socketHeader(), address);
}
