/** One thing that is wrong with a document: where, what is allowed, and the value found there (shortened). */
export interface Issue {
  /** components[2].parameters.setPressure.value */
  readonly path: string;
  readonly message: string;
  readonly value: unknown;
}
