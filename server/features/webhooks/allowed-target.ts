import { lookup as dnsLookup, type LookupAddress, type LookupOptions } from 'node:dns';
import { BlockList, isIP } from 'node:net';

/**
 * Addresses that are not of the public internet: a webhook there could make the server ask machines
 * of its own network (RFC 6890 and the registries it names).
 */
const inner = new BlockList();
for (const [net, prefix] of [
  ['0.0.0.0', 8],
  ['10.0.0.0', 8],
  ['100.64.0.0', 10],
  ['127.0.0.0', 8],
  ['169.254.0.0', 16],
  ['172.16.0.0', 12],
  ['192.0.0.0', 24],
  ['192.168.0.0', 16],
  ['198.18.0.0', 15],
  ['224.0.0.0', 4],
  ['240.0.0.0', 4],
] as const) {
  inner.addSubnet(net, prefix, 'ipv4');
}
for (const [net, prefix] of [
  ['::', 128],
  ['::1', 128],
  ['64:ff9b::', 96],
  ['fc00::', 7],
  ['fe80::', 10],
  ['ff00::', 8],
] as const) {
  inner.addSubnet(net, prefix, 'ipv6');
}

export class TargetRefused extends Error {}

/** Whether an IP address is of an inner network; IPv4 in IPv6 clothes counts as IPv4. */
export const isInnerAddress = (address: string): boolean =>
  inner.check(address, isIP(address) === 6 ? 'ipv6' : 'ipv4');

const refusal = (host: string) =>
  new TargetRefused(
    `${host} is an address of an inner network, which this installation does not allow.`,
  );

/** A host written as an address is never looked up by name, so it is checked by itself. */
export function refuseInnerHost(url: URL): void {
  const host = url.hostname.replace(/^\[|\]$/g, '');
  if (isIP(host) !== 0 && isInnerAddress(host)) throw refusal(host);
  if (/(^|\.)localhost\.?$/i.test(host)) throw refusal(host);
}

type Found = (
  error: NodeJS.ErrnoException | null,
  address: string | LookupAddress[],
  family?: number,
) => void;

/**
 * Looks a name up for a connection and refuses it where any address is an inner one. Being the
 * look-up of the connection itself, no second answer of the name server can slip in between.
 */
export function publicLookup(host: string, options: LookupOptions, found: Found): void {
  dnsLookup(host, { ...options, all: true }, (error, addresses) => {
    if (error) {
      found(error, []);
      return;
    }
    const [first] = addresses;
    if (first === undefined || addresses.some(({ address }) => isInnerAddress(address))) {
      found(refusal(host), []);
    } else if (options.all) {
      found(null, addresses);
    } else {
      found(null, first.address, first.family);
    }
  });
}
