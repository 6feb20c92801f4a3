/** Sentence for a database that cannot be used; null when the error is of another sort.
 *  @param where host and port without credentials */
export function databaseProblem(error: unknown, where: string): string | null {
  const codes = codesOf(error);
  const has = (...wanted: string[]) => wanted.some((code) => codes.includes(code));
  if (has('ECONNREFUSED')) return `No database answers at ${where}: start PostgreSQL there or correct DATABASE_URL.`;
  if (has('ENOTFOUND', 'EAI_AGAIN')) return `The database host in ${where} is not known: correct DATABASE_URL.`;
  if (has('ETIMEDOUT', 'EHOSTUNREACH', 'ENETUNREACH', 'timeout'))
    return `The database at ${where} cannot be reached: check the network and DATABASE_URL.`;
  if (has('28P01', '28000')) return `The database at ${where} refuses this user or password: correct DATABASE_URL.`;
  if (has('3D000')) return `The database named in DATABASE_URL does not exist at ${where}: create it first.`;
  if (has('42501')) return `The database user in DATABASE_URL may not create tables at ${where}: give it that right.`;
  if (has('53100')) return `The disk of the database at ${where} is full: free some space there.`;
  if (has('53300')) return `The database at ${where} has no connection to spare: raise its limit or stop other programs.`;
  if (has('57P03')) return `The database at ${where} is still starting: try again in a moment.`;
  if (has('ECONNRESET', 'EPIPE', '57P01')) return `The database at ${where} broke off the connection.`;
  return null;
}

/** Codes of an error and of everything inside it (an AggregateError has one for each address that was tried). */
function codesOf(error: unknown, depth = 0): string[] {
  if (!(error instanceof Error) || depth > 4) return [];
  const own = 'code' in error && typeof error.code === 'string' ? [error.code] : [];
  if (/timeout/i.test(error.message)) own.push('timeout');
  const inner = error instanceof AggregateError ? error.errors : [];
  return [...own, ...inner.flatMap((entry) => codesOf(entry, depth + 1)), ...codesOf(error.cause, depth + 1)];
}

/** Host, port and name of a database address, without user and password. */
export function databasePlace(url: string): string {
  const { hostname, port, pathname } = new URL(url);
  return `${hostname || 'localhost'}:${port || 5432}${pathname}`;
}
