/** The colour of the sky by the height of the sun: night, dusk, rose twilight, straw daylight, pale day. */
const stops: readonly (readonly [altitudeDeg: number, red: number, green: number, blue: number])[] = [
  [-12, 0x1e, 0x24, 0x40],
  [-6, 0x5d, 0x5a, 0x86],
  [-2, 0xc9, 0x8f, 0x86],
  [1.5, 0xf0, 0xb9, 0x5b],
  [12, 0xf6, 0xdc, 0xa8],
  [35, 0xfb, 0xf3, 0xdf],
];

/** Colour as `#rrggbb` for a sun altitude in degrees. */
export function skyColour(altitudeDeg: number): string {
  const upper = stops.findIndex(([altitude]) => altitudeDeg <= altitude);
  const [low, high] = upper === -1 ? [stops.at(-1)!, stops.at(-1)!] : upper === 0 ? [stops[0]!, stops[0]!] : [stops[upper - 1]!, stops[upper]!];
  const share = high[0] === low[0] ? 0 : (altitudeDeg - low[0]) / (high[0] - low[0]);
  const channel = (index: 1 | 2 | 3): string => Math.round(low[index] + share * (high[index] - low[index])).toString(16).padStart(2, '0');
  return `#${channel(1)}${channel(2)}${channel(3)}`;
}
