import type { Actor } from '#server/access/actor.ts';

/** Who may have a document run without keeping it: everyone, guests too; the limits of the route protect the server. */
const allowed: Readonly<Record<Actor['kind'], boolean>> = {
  guest: true,
  operator: true,
};

export function maySimulate(actor: Actor): boolean {
  return allowed[actor.kind];
}
