/** The last words that lead to a figure of a sentence, as its name: "… for the motor’s pull-out torque". */
export function wordsBefore(text: unknown): string {
  const clause =
    typeof text === 'string'
      ? (text
          .split(/[.;:]\s/)
          .filter((part) => /\p{L}/u.test(part))
          .pop() ?? '')
      : '';
  const words = clause
    .replace(/[\s.,;:(]+$/, '')
    .split(/\s+/)
    .filter((word) => /[\p{L}\d]/u.test(word));
  if (words.length === 0) return 'Figure of this run';
  return words.length > 5 ? `… ${words.slice(-5).join(' ')}` : words.join(' ');
}
