import type * as z from 'zod/mini';

/** A request that the server did not answer as agreed. */
export class ApiFault extends Error {
  constructor(
    message: string,
    readonly status: number | null,
  ) {
    super(message);
  }
}

/** GET of a JSON answer, held against its contract. Paths are relative to the page's base. */
export async function getJson<T>(path: string, contract: z.ZodMiniType<T>, accept: readonly number[] = [200]): Promise<T> {
  let response: Response;
  try {
    response = await fetch(new URL(path, document.baseURI), { headers: { Accept: 'application/json' } });
  } catch {
    throw new ApiFault('The server does not answer.', null);
  }
  if (!accept.includes(response.status)) throw new ApiFault(`The server answered with ${response.status}.`, response.status);
  const checked = contract.safeParse(await response.json().catch(() => null));
  if (!checked.success) throw new ApiFault('The server answered in a form that this page does not know.', response.status);
  return checked.data;
}
