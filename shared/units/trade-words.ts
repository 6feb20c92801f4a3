/** The trade's word pairs (PRODUCT.md): texts are written with the first word of each pair; a person who reads US units
 *  gets the US one. Only words that differ between the two trades stand here. */

interface Pair {
  readonly word: RegExp;
  readonly us: string;
}

const pairs: readonly Pair[] = [
  { word: /\block([ -])nut/gi, us: 'jam$1nut' },
  { word: /\bpull-out\b/gi, us: 'breakdown' },
  { word: /\brelief passing\b/gi, us: 'relief blowing' },
  { word: /\bstuck in star\b/gi, us: 'stuck in wye' },
];

/** The text in the words of the person's trade; unchanged for SI. A capital at the start stays one. */
export function tradeWords(text: string, system: 'si' | 'us'): string {
  if (system === 'si') return text;
  let out = text;
  for (const { word, us } of pairs) {
    out = out.replace(word, (found: string, ...rest: unknown[]) => {
      const next = us.replace('$1', typeof rest[0] === 'string' ? rest[0] : '');
      return /^[A-Z]/.test(found) ? next[0]!.toUpperCase() + next.slice(1) : next;
    });
  }
  return out;
}
