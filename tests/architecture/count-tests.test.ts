import { expect, test } from 'vitest';
import { countTests } from '../count-tests.mjs';

const file = (name: string, status: string, ...tests: string[]) => ({
  name,
  status,
  assertionResults: tests.map((state, index) => ({ status: state, fullName: `test ${index}` })),
});

test('passed and failed tests are counted', () => {
  expect(countTests({ testResults: [file('a', 'failed', 'passed', 'failed'), file('b', 'passed', 'passed')] }, 1)).toEqual({
    passed: 2,
    failed: 1,
    remarks: [],
  });
});

test('a file that did not load, a test that did not run, and a missing report are failures', () => {
  expect(countTests({ testResults: [file('a', 'failed'), file('b', 'passed', 'passed')] }, 1)).toMatchObject({ passed: 1, failed: 1 });
  expect(countTests({ testResults: [file('a', 'passed', 'passed', 'skipped', 'todo')] }, 0)).toMatchObject({ passed: 1, failed: 2 });
  expect(countTests(null, 0)).toMatchObject({ passed: 0, failed: 1 });
  expect(countTests({ testResults: [] }, 0)).toMatchObject({ passed: 0, failed: 1 });
});

test('a bad end without a failed test is a failure', () => {
  expect(countTests({ testResults: [file('a', 'passed', 'passed')] }, 1)).toMatchObject({ passed: 1, failed: 1 });
});
