import type { DataSource } from 'typeorm';
import { type Shop, shopEntity } from './shops.entity.ts';

/** The only file of the feature that touches TypeORM. */
export interface ShopStore {
  all(): Promise<Shop[]>;
  add(shop: { id: string; name: string }): Promise<Shop>;
  /** @returns false when there is no such shop */
  rename(id: string, name: string): Promise<boolean>;
}

export function createShopStore(source: DataSource): ShopStore {
  const shops = source.getRepository(shopEntity);
  return {
    all: () => shops.find({ order: { createdAt: 'ASC', id: 'ASC' } }),
    add: async (shop) => {
      await shops.insert(shop);
      return shops.findOneByOrFail({ id: shop.id });
    },
    rename: async (id, name) => (await shops.update({ id }, { name })).affected === 1,
  };
}
