/** A reason for which starting cannot go on, in one sentence a person can act on. Printed without a stack. */
export class Problem extends Error {}

const known = [
  [/ENOSPC|No space left on device|not enough free space/i, (where) => `The disk is full: free some space for ${where} and start again.`],
  [/EDQUOT|Disk quota exceeded/i, (where) => `The disk quota is used up: free some space for ${where} and start again.`],
  [/EROFS|Read-only file system/i, (where) => `${where} lies on a read-only file system: choose another place or make it writable.`],
  [
    /EACCES|EPERM|Permission denied|Operation not permitted/i,
    (where) => `This user may not write to ${where}: change its owner or choose another place.`,
  ],
];

/** Sentence for an error of the operating system (an Error, or the text a tool printed); null when it is none of the usual ones. */
export function systemSentence(cause, where) {
  const text = cause instanceof Error ? `${cause.code ?? ''} ${cause.message}` : String(cause);
  for (const [pattern, sentence] of known) if (pattern.test(text)) return sentence(where);
  return null;
}

/** Runs `action`; an operating-system error on `where` comes out as a Problem. */
export function guarded(where, action) {
  try {
    return action();
  } catch (cause) {
    const sentence = systemSentence(cause, where);
    if (sentence) throw new Problem(sentence, { cause });
    throw cause;
  }
}

/** Last words of a launcher: one line on stderr. Anything that is not a Problem is a fault of the product and is named as such. */
export function sayProblem(error) {
  const sentence =
    error instanceof Problem
      ? error.message
      : (systemSentence(error, error?.path ?? 'the files of Swashbench') ??
        `Starting failed for a reason that was not foreseen: ${error?.message ?? error}`);
  process.stderr.write(`${sentence}\n`);
}
