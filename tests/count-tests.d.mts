/** The part of vitest's JSON report that is counted. */
export interface TestReport {
  readonly testResults: readonly {
    readonly name: string;
    readonly status: string;
    readonly assertionResults: readonly { readonly status: string; readonly fullName: string }[];
  }[];
}
export function countTests(report: TestReport | null, code: number): { passed: number; failed: number; remarks: string[] };
