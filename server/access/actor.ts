/** Who asks. Services hand the actor to their policy before they read or write.
 *  Accounts will add members with a shop and a role; until then everyone on the web is a guest. */
export type Actor =
  /** Anyone who opened the site: has the bench, keeps nothing on the server. */
  | { readonly kind: 'guest' }
  /** Whoever may run commands on the server's machine. */
  | { readonly kind: 'operator' };

export const guest: Actor = { kind: 'guest' };
export const operator: Actor = { kind: 'operator' };
