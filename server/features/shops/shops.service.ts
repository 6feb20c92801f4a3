import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import type { Actor } from '#server/access/actor.ts';
import { AppError } from '#server/errors.ts';
import type { Shop } from './shops.entity.ts';
import { mayWithShops, type ShopAction } from './shops.policy.ts';
import type { ShopStore } from './shops.store.ts';

const shopName = z.string().trim().min(1).max(120);
const shopId = z.uuid();

export interface ShopService {
  list(actor: Actor): Promise<Shop[]>;
  create(actor: Actor, name: string): Promise<Shop>;
  rename(actor: Actor, id: string, name: string): Promise<void>;
}

/** Rules about shops. Every method asks the policy before it reads or writes. */
export function createShopService(store: ShopStore): ShopService {
  return {
    list: async (actor) => {
      ask(actor, 'list');
      return store.all();
    },
    create: async (actor, name) => {
      ask(actor, 'create');
      return store.add({ id: randomUUID(), name: checkedName(name) });
    },
    rename: async (actor, id, name) => {
      ask(actor, 'rename');
      const checked = checkedName(name);
      const found = shopId.safeParse(id).success && (await store.rename(id, checked));
      if (!found)
        throw new AppError('not-found', {
          message: `There is no shop with the id "${id}".`,
        });
    },
  };
}

function ask(actor: Actor, action: ShopAction): void {
  if (!mayWithShops(actor, action))
    throw new AppError('not-allowed', {
      message: `You may not ${action} shops.`,
    });
}

function checkedName(name: string): string {
  const parsed = shopName.safeParse(name);
  if (parsed.success) return parsed.data;
  throw new AppError('bad-input', {
    message: 'The name of a shop must have 1 to 120 characters.',
    details: [
      {
        path: 'name',
        message: `has ${name.trim().length} characters: 1 to 120 are allowed`,
      },
    ],
  });
}
