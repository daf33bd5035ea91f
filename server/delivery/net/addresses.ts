import { BlockList, isIP } from 'node:net';

/**
 * Addresses that no outgoing call may reach: special-purpose blocks of the IANA registries (RFC 6890 and its updates), with the
 * link-local address at which hosting firms keep their metadata.
 */
const refused4 = new BlockList();
for (const block of [
  '0.0.0.0/8', '10.0.0.0/8', '100.64.0.0/10', '127.0.0.0/8', '169.254.0.0/16', '172.16.0.0/12', '192.0.0.0/24', '192.0.2.0/24', '192.31.196.0/24', '192.52.193.0/24',
  '192.88.99.0/24', '192.168.0.0/16', '192.175.48.0/24', '198.18.0.0/15', '198.51.100.0/24', '203.0.113.0/24', '224.0.0.0/4', '240.0.0.0/4',
]) {
  const [network, prefix] = block.split('/') as [string, string];
  refused4.addSubnet(network, Number(prefix), 'ipv4');
}

/**
 * In IPv6 only global unicast (2000::/3) is reachable, less the blocks in it that wrap an IPv4 address (Teredo, 6to4) or serve
 * documentation and tests. IPv4-mapped, -compatible and NAT64 addresses lie outside 2000::/3.
 */
const global6 = new BlockList();
global6.addSubnet('2000::', 3, 'ipv6');
const refused6 = new BlockList();
for (const [network, prefix] of [['2001::', 23], ['2001:db8::', 32], ['2002::', 16], ['3fff::', 20]] as const) refused6.addSubnet(network, prefix, 'ipv6');

/** Whether an address literal (IPv6 with or without brackets) is reachable for everyone on the internet. */
export function isPublicAddress(address: string): boolean {
  const bare = address.replace(/^\[|\]$/g, '');
  if (isIP(bare) === 4) return !refused4.check(bare, 'ipv4');
  // An address with a zone (fe80::1%eth0) is local by its nature.
  if (isIP(bare) === 6 && !bare.includes('%')) return global6.check(bare, 'ipv6') && !refused6.check(bare, 'ipv6');
  return false;
}

/** Whether a URL's host name is an address literal. */
export const isAddress = (host: string): boolean => isIP(host.replace(/^\[|\]$/g, '')) !== 0;
