import { expect, it, vi } from 'vitest';
import { countResults } from './test-results.mjs';

vi.spyOn(console, 'error').mockImplementation(() => undefined);
const report = (more: object) => ({
  numPassedTests: 7,
  numFailedTests: 0,
  numPendingTests: 0,
  numTodoTests: 0,
  testResults: [],
  ...more,
});

it('counts what the report says', () => {
  expect(countResults(report({ numFailedTests: 2, numPendingTests: 1 }), 1, '/')).toEqual({
    passed: 7,
    failed: 2,
    skipped: 1,
  });
  expect(countResults(report({}), 0, '/')).toEqual({ passed: 7, failed: 0, skipped: 0 });
});

it('never calls a broken run a good one', () => {
  expect(countResults(null, 0, '/').failed).toBe(1);
  expect(countResults(report({}), 1, '/').failed).toBe(1);
  const unloadable = [
    { name: '/a.test.ts', status: 'failed', message: 'no such module', assertionResults: [] },
  ];
  expect(countResults(report({ testResults: unloadable }), 1, '/').failed).toBe(1);
});
