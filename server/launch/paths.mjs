import { fileURLToPath } from 'node:url';

/** Root of the checkout, with a closing slash removed. */
export const root = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');
