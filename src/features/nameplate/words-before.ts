/** The last words that lead to a figure of a sentence, as its name: "… the motor’s pull-out torque". */
export function wordsBefore(text: unknown): string {
  const clause =
    typeof text === 'string'
      ? (text
          .replace(/[\s,;:(]+$/, '')
          .split(/[.;:]\s/)
          .pop() ?? '')
      : '';
  const words = clause.trim().split(/\s+/).filter(Boolean);
  if (words.length === 0) return 'Figure of this run';
  return words.length > 5 ? `… ${words.slice(-5).join(' ')}` : words.join(' ');
}
