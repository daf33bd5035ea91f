/** An address with its middle hidden: `n…e@example.org`; a short name keeps its first letter only. */
export function maskedAddress(address: string): string {
  const at = address.lastIndexOf('@');
  if (at < 1) return '…';
  const name = address.slice(0, at);
  return `${name[0]!}…${name.length > 3 ? name.at(-1)! : ''}${address.slice(at)}`;
}
