import { CreateShops1764590400000 } from './1764590400000-create-shops.ts';

/** Every migration, oldest first. An explicit list, so that the bundle has them. */
export const migrations = [CreateShops1764590400000];
