import type { Role } from '../../shared/rules/authorization.ts';

export const roleWords: Record<Role, { name: string; hint: string }> = {
  owner: { name: 'Owner', hint: 'Does everything, people and settings included.' },
  applicator: { name: 'Applicator', hint: 'Plans and sprays; keeps blocks, products and sprayers.' },
  crew: { name: 'Crew', hint: 'Mixes and measures; changes no plans.' },
  observer: { name: 'Observer', hint: 'Reads everything, changes nothing.' },
};
