/** Placing marks and words so that they do not cover each other. All in pixels. */

/** Moves positions apart so that neighbours are at least `gap` from each other and inside [low, high], keeping their order
 *  and moving as little as may be. When there is no room for all, they are spread evenly. */
export function pushApart(positions: readonly number[], gap: number, low: number, high: number): number[] {
  const order = positions.map((value, index) => ({ value, index })).sort((a, b) => a.value - b.value || a.index - b.index);
  const n = order.length;
  const result = new Array<number>(n).fill(0);
  if (n === 0) return result;
  if ((n - 1) * gap >= high - low) {
    order.forEach((entry, k) => {
      result[entry.index] = n === 1 ? (low + high) / 2 : low + ((high - low) * k) / (n - 1);
    });
    return result;
  }
  // Pool neighbours that touch into blocks that sit at the mean of where their members would like to be.
  const blocks: { sum: number; count: number; start: number }[] = [];
  order.forEach((entry, k) => {
    let block = { sum: entry.value, count: 1, start: k };
    for (;;) {
      const before = blocks[blocks.length - 1];
      if (!before || first(before, gap, low, high) + before.count * gap <= first(block, gap, low, high)) break;
      blocks.pop();
      block = {
        sum: before.sum + block.sum,
        count: before.count + block.count,
        start: before.start,
      };
    }
    blocks.push(block);
  });
  for (const block of blocks) {
    const start = first(block, gap, low, high);
    for (let k = 0; k < block.count; k += 1) result[(order[block.start + k] as { index: number }).index] = start + k * gap;
  }
  return result;
}

function first(block: { readonly sum: number; readonly count: number }, gap: number, low: number, high: number): number {
  const span = (block.count - 1) * gap;
  return Math.min(Math.max(block.sum / block.count - span / 2, low), high - span);
}

export interface Box {
  readonly x: number;
  readonly y: number;
  readonly w: number;
  readonly h: number;
}

export function overlaps(a: Box, b: Box, clear = 0): boolean {
  return a.x < b.x + b.w + clear && b.x < a.x + a.w + clear && a.y < b.y + b.h + clear && b.y < a.y + a.h + clear;
}

/** First of the candidate places that stays inside the frame and covers nothing taken; null when there is none. */
export function freePlace(candidates: readonly Box[], taken: readonly Box[], frame: Box): Box | null {
  for (const box of candidates) {
    if (box.x < frame.x || box.y < frame.y || box.x + box.w > frame.x + frame.w || box.y + box.h > frame.y + frame.h) continue;
    if (!taken.some((other) => overlaps(box, other, 1))) return box;
  }
  return null;
}

/** Width of words in the body face, from mean advance widths: good enough to keep labels apart. */
export function textWidth(words: string, size: number, weight = 400): number {
  let em = 0;
  for (const sign of words) {
    em += /[iljtfr.,:;'|! ]/.test(sign) ? 0.3 : /[mwMW@]/.test(sign) ? 0.86 : /[A-Z]/.test(sign) ? 0.66 : 0.54;
  }
  return em * size * (weight >= 600 ? 1.06 : 1);
}

/** Row of each flag (0 = top), or −1 where it must become a tick: flags in one row never touch.
 *  @param flags left edge and width, in order of time */
export function stackFlags(flags: readonly { readonly x: number; readonly width: number }[], rows: number, gap: number): number[] {
  const end = new Array<number>(rows).fill(Number.NEGATIVE_INFINITY);
  return flags.map((flag) => {
    for (let row = 0; row < rows; row += 1) {
      if (flag.x >= (end[row] as number) + gap) {
        end[row] = flag.x + flag.width;
        return row;
      }
    }
    return -1;
  });
}
