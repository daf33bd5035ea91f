/** The one table of rights: resource × action × role. The server enforces it, the pages hide by it, a test walks it. */
export const roles = ['owner', 'applicator', 'crew', 'observer'] as const;
export type Role = (typeof roles)[number];

export const actions = ['read', 'create', 'update', 'archive', 'run'] as const;
export type Action = (typeof actions)[number];

const everyone: readonly Role[] = ['owner', 'applicator', 'crew', 'observer'];
const workers: readonly Role[] = ['owner', 'applicator', 'crew'];
const planners: readonly Role[] = ['owner', 'applicator'];
const owner: readonly Role[] = ['owner'];
const nobody: readonly Role[] = [];

type Rights = Readonly<Record<Action, readonly Role[]>>;
const rights = (read: readonly Role[], create: readonly Role[], update = create, archive = update, run = nobody): Rights => ({ read, create, update, archive, run });

export const authorization = {
  farm: rights(everyone, nobody, owner, owner),
  block: rights(everyone, planners),
  sensitivePlace: rights(everyone, planners),
  sprayer: rights(everyone, planners),
  product: rights(everyone, planners),
  plan: rights(everyone, planners),
  /** `run` fetches a fresh forecast and assesses anew. */
  morning: rights(everyone, nobody, nobody, nobody, planners),
  reading: rights(everyone, workers, nobody, planners),
  /** `run` sends a dead delivery again or a test notice to oneself. */
  notice: rights(everyone, nobody, nobody, nobody, planners),
  /** A person's own phones and wishes; never another's. */
  device: rights(everyone, everyone, everyone, everyone, everyone),
  person: rights(everyone, owner, owner, owner),
  webhook: rights(owner, owner, owner, owner, owner),
  inboundSource: rights(owner, owner, owner, owner),
  audit: rights(owner, nobody),
} as const satisfies Record<string, Rights>;

export type Resource = keyof typeof authorization;

/** Whether a role may do an action on a resource. */
export function may(role: Role, action: Action, resource: Resource): boolean {
  return authorization[resource][action].includes(role);
}
