/** IRAC groups by number and letters, with examples: v11.3, January 2025 [iracMoa, from memory; 9, 10, 20–25, 29 checked in part]. */
export const iracGroups: Readonly<Record<string, { action: string; examples: readonly string[] }>> = {
  '1A': { action: 'acetylcholinesterase inhibitor', examples: ['carbaryl', 'methomyl'] },
  '1B': { action: 'acetylcholinesterase inhibitor', examples: ['chlorpyrifos', 'dimethoate', 'malathion', 'acephate'] },
  '2B': { action: 'GABA-gated chloride channel blocker', examples: ['fipronil'] },
  '3A': { action: 'sodium channel modulator', examples: ['bifenthrin', 'permethrin', 'esfenvalerate', 'lambda-cyhalothrin'] },
  '4A': { action: 'nicotinic receptor agonist', examples: ['imidacloprid', 'acetamiprid', 'thiamethoxam', 'dinotefuran', 'clothianidin'] },
  '4C': { action: 'nicotinic receptor agonist', examples: ['sulfoxaflor'] },
  '4D': { action: 'nicotinic receptor agonist', examples: ['flupyradifurone'] },
  '5': { action: 'nicotinic receptor allosteric modulator, site I', examples: ['spinosad', 'spinetoram'] },
  '6': { action: 'glutamate-gated chloride channel modulator', examples: ['abamectin', 'emamectin'] },
  '7C': { action: 'juvenile hormone mimic', examples: ['pyriproxyfen'] },
  '9B': { action: 'chordotonal organ TRPV channel modulator', examples: ['pymetrozine', 'pyrifluquinazon'] },
  '9D': { action: 'chordotonal organ TRPV channel modulator', examples: ['afidopyropen'] },
  '10A': { action: 'mite growth inhibitor', examples: ['hexythiazox', 'clofentezine'] },
  '10B': { action: 'mite growth inhibitor', examples: ['etoxazole'] },
  '11A': { action: 'microbial disruptor of midgut membranes', examples: ['Bacillus thuringiensis'] },
  '12B': { action: 'inhibitor of mitochondrial ATP synthase', examples: ['fenbutatin oxide'] },
  '12C': { action: 'inhibitor of mitochondrial ATP synthase', examples: ['propargite'] },
  '15': { action: 'chitin synthesis inhibitor', examples: ['diflubenzuron', 'novaluron'] },
  '16': { action: 'chitin synthesis inhibitor, type 1', examples: ['buprofezin'] },
  '18': { action: 'ecdysone receptor agonist', examples: ['tebufenozide', 'methoxyfenozide'] },
  '20B': { action: 'mitochondrial complex III inhibitor', examples: ['acequinocyl'] },
  '20D': { action: 'mitochondrial complex III inhibitor', examples: ['bifenazate'] },
  '21A': { action: 'mitochondrial complex I inhibitor', examples: ['fenpyroximate', 'pyridaben', 'tebufenpyrad', 'fenazaquin', 'tolfenpyrad'] },
  '22': { action: 'sodium channel blocker', examples: ['indoxacarb'] },
  '23': { action: 'acetyl-CoA carboxylase inhibitor', examples: ['spirodiclofen', 'spiromesifen', 'spirotetramat', 'spiropidion'] },
  '25A': { action: 'mitochondrial complex II inhibitor', examples: ['cyflumetofen', 'cyenopyrafen'] },
  '28': { action: 'ryanodine receptor modulator', examples: ['chlorantraniliprole', 'cyantraniliprole'] },
  '29': { action: 'chordotonal organ nicotinamidase inhibitor', examples: ['flonicamid'] },
  '30': { action: 'GABA-gated chloride channel allosteric modulator', examples: ['broflanilide', 'isocycloseram'] },
  '31': { action: 'baculovirus', examples: ['granuloviruses', 'nucleopolyhedroviruses'] },
  UN: { action: 'unknown or uncertain', examples: ['azadirachtin', 'sulfur'] },
  UNB: { action: 'bacterial agent of unknown action', examples: [] },
  UNE: { action: 'botanical essence of unknown action', examples: [] },
  UNF: { action: 'fungal agent of unknown action', examples: [] },
  UNM: { action: 'non-specific mechanical disruptor', examples: ['mineral oil', 'diatomaceous earth'] },
  UNP: { action: 'peptide of unknown action', examples: [] },
};

export interface MoaGroup {
  system: string;
  /** As entered, capitals: `4A`. */
  code: string;
  /** What rotation goes by, with its system: `IRAC 4`. Null for codes without a number: no inference is possible. */
  rotates: string | null;
}

/**
 * Groups in an entry such as `3A + 4A`: a premix counts as both. Same number = same group; letters are subgroups [iracMoa].
 * @param system `IRAC`, `FRAC`, `HRAC` or `none` @returns each code once; empty for no entry
 */
export function moaGroupsOf(system: string, entry: string): MoaGroup[] {
  if (system === 'none') return [];
  const codes = entry.toUpperCase().replaceAll(/\bGROUPS?\b/g, ' ').split(/[^A-Z0-9]+/).filter((code) => code !== '' && code !== 'AND');
  return [...new Set(codes)].map((code) => {
    const number = /^0*(\d+)/.exec(code)?.[1];
    return { system, code, rotates: number === undefined ? null : `${system} ${number}` };
  });
}

/** Numbers that act on one organ, where resistance may cross though the numbers differ [iracMoa: 9 and 29, chordotonal]. */
const related: readonly (readonly string[])[] = [['IRAC 9', 'IRAC 29']];
export const areRelated = (a: string, b: string): boolean => a !== b && related.some((kin) => kin.includes(a) && kin.includes(b));
