import { EntitySchema } from 'typeorm';

/** A team's space. Every later row carries the id of its shop. */
export interface Shop {
  readonly id: string;
  name: string;
  readonly createdAt: Date;
}

export const shopEntity = new EntitySchema<Shop>({
  name: 'Shop',
  tableName: 'shop',
  columns: {
    id: { type: 'uuid', primary: true },
    name: { type: 'text' },
    createdAt: {
      type: 'timestamptz',
      name: 'created_at',
      createDate: true,
      default: () => 'now()',
    },
  },
});
