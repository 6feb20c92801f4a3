/** Colours and faces of the theme in force, read from the page's CSS variables for the canvas. */
export interface Tokens {
  readonly ink: string;
  readonly ink2: string;
  readonly ink3: string;
  readonly rule: string;
  readonly sheet: string;
  readonly paper: string;
  readonly stall: string;
  readonly cases: readonly string[];
  readonly body: string;
  readonly reading: string;
  /** Size factor of the projector mode. */
  readonly step: number;
}

export function readTokens(element: Element): Tokens {
  const style = getComputedStyle(element);
  const of = (name: string, otherwise: string) => style.getPropertyValue(name).trim() || otherwise;
  return {
    ink: of('--ink', '#000'),
    ink2: of('--ink2', '#333'),
    ink3: of('--ink3', '#555'),
    rule: of('--rule', '#ccc'),
    sheet: of('--sheet', '#fff'),
    paper: of('--paper', '#fff'),
    stall: of('--verdict-motor-stalls', '#700'),
    cases: Array.from({ length: 10 }, (_, i) => of(`--case-${i}`, '#000')),
    body: of('--body', 'sans-serif'),
    reading: of('--reading', 'sans-serif'),
    step: Number(of('--step', '1')) || 1,
  };
}
