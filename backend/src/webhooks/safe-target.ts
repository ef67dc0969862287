// Where a webhook may point: out into the world, never back into the network the server stands in.
import { lookup } from 'node:dns/promises';
import { BlockList, isIP, isIPv6 } from 'node:net';

export interface TargetRules {
  /** https only. */
  httpsOnly: boolean;
  /** Loopback and private addresses too: for trials on one machine. */
  privateToo: boolean;
  /** The system's resolver, but in tests. */
  resolve?: (host: string) => Promise<string[]>;
}

export interface SafeTarget {
  url: URL;
  /** The very addresses that were checked; the connection goes to one of these and asks no resolver again. */
  addresses: string[];
}

export class UnsafeTarget extends Error {
  override name = 'UnsafeTarget';
}

// IANA special-purpose registries (RFC 6890 and its updates), multicast included.
const blocked = new BlockList();
for (const range of [
  '0.0.0.0/8 10.0.0.0/8 100.64.0.0/10 127.0.0.0/8 169.254.0.0/16 172.16.0.0/12 192.0.0.0/24 192.0.2.0/24 192.88.99.0/24',
  '192.168.0.0/16 198.18.0.0/15 198.51.100.0/24 203.0.113.0/24 224.0.0.0/4 240.0.0.0/4',
].flatMap((line) => line.split(' '))) {
  const [net, bits] = range.split('/') as [string, string];
  blocked.addSubnet(net, Number(bits), 'ipv4');
}
/** Only global unicast is let through, and of that not what embeds an IPv4 address or documents something. */
const globalUnicast = new BlockList();
globalUnicast.addSubnet('2000::', 3, 'ipv6');
const blockedIpv6 = new BlockList();
for (const [net, bits] of [
  ['2001::', 23],
  ['2001:db8::', 32],
  ['2002::', 16],
  ['3fff::', 20],
] as const)
  blockedIpv6.addSubnet(net, bits, 'ipv6');

export function isPublicAddress(address: string): boolean {
  const plain = address.split('%')[0]!;
  if (isIPv6(plain)) return globalUnicast.check(plain, 'ipv6') && !blockedIpv6.check(plain, 'ipv6');
  return isIP(plain) === 4 && !blocked.check(plain, 'ipv4');
}

/** Checks the address by its text alone: scheme, user info, a host that is an address. @throws UnsafeTarget in one sentence */
export function readTarget(text: string, { httpsOnly, privateToo }: TargetRules): URL {
  let url: URL;
  try {
    url = new URL(text);
  } catch {
    throw new UnsafeTarget('This is not an address.');
  }
  if (url.protocol !== 'https:' && (httpsOnly || url.protocol !== 'http:')) throw new UnsafeTarget('The address has to begin with https.');
  if (url.username !== '' || url.password !== '') throw new UnsafeTarget('An address with a name or password in it is not taken.');
  const host = hostOf(url);
  if (!privateToo && isIP(host) !== 0 && !isPublicAddress(host)) throw new UnsafeTarget(`${host} is not an address of the public network.`);
  if (!privateToo && /(^|\.)(localhost|local|internal|home\.arpa)\.?$/i.test(host))
    throw new UnsafeTarget(`${host} is a name of a private network.`);
  return url;
}

/** Also looks the name up: all its addresses have to be public. @throws UnsafeTarget */
export async function checkTarget(text: string, rules: TargetRules): Promise<SafeTarget> {
  const url = readTarget(text, rules);
  const host = hostOf(url);
  const addresses = isIP(host) !== 0 ? [host] : await addressesOf(host, rules);
  const secret = rules.privateToo ? undefined : addresses.find((address) => !isPublicAddress(address));
  if (secret !== undefined) throw new UnsafeTarget(`${host} leads to an address that is not of the public network.`);
  return { url, addresses };
}

async function addressesOf(host: string, { resolve = systemResolve }: TargetRules): Promise<string[]> {
  let addresses: string[] = [];
  try {
    addresses = await resolve(host);
  } catch {
    // Told below as a name without an address.
  }
  if (addresses.length === 0) throw new UnsafeTarget(`${host} has no address.`);
  return addresses;
}

const systemResolve = async (host: string) => (await lookup(host, { all: true })).map(({ address }) => address);
const hostOf = ({ hostname }: URL) => hostname.replace(/^\[|\]$/g, '');
