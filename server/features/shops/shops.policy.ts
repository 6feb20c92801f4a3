import type { Actor } from '#server/access/actor.ts';

export type ShopAction = 'list' | 'create' | 'rename';

/** Who may do what with shops. The list of shops is nobody's business but the operator's: nothing public shows it. */
const allowed: Readonly<Record<Actor['kind'], readonly ShopAction[]>> = {
  guest: [],
  operator: ['list', 'create', 'rename'],
};

export function mayWithShops(actor: Actor, action: ShopAction): boolean {
  return allowed[actor.kind].includes(action);
}
