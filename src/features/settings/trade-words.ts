/** US/EU pairs of the product's words (PRODUCT.md). */
export const tradePairs = [
  ['max. volume stop (vol. stop)', 'stroke limiter (EU)'],
  ['lock nut', 'jam nut (US)'],
  ['pull-out torque', 'breakdown torque (US)'],
  ['relief passing', 'relief blowing (US)'],
  ['stuck in star', 'stuck in wye (US)'],
  ['dead-head', 'cut-off, zero flow'],
] as const;
