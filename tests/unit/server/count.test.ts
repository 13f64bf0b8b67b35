import { describe, expect, it, vi } from 'vitest';
import { count } from '../../../server/cli/setup/count.mjs';

const file = (status: string, ...tests: string[]) => ({ name: 'x.test.ts', status, assertionResults: tests.map((one) => ({ status: one, fullName: 'a test' })) });

describe('the count of npm test', () => {
  it.each([
    ['all passed', [file('passed', 'passed', 'passed')], { passed: 2, failed: 0 }],
    ['one failed', [file('failed', 'passed', 'failed'), file('passed', 'passed')], { passed: 2, failed: 1 }],
    ['one skipped', [file('passed', 'passed', 'skipped')], { passed: 1, failed: 1 }],
    ['one to do', [file('passed', 'todo')], { passed: 0, failed: 1 }],
    ['a file that could not be run', [file('failed'), file('passed', 'passed')], { passed: 1, failed: 1 }],
    ['a file whose hook failed', [file('failed', 'skipped', 'passed')], { passed: 1, failed: 2 }],
    ['nothing', [], { passed: 0, failed: 0 }],
  ])('%s', (_, testResults, counted) => {
    expect(count({ testResults }, () => {})).toEqual(counted);
  });

  it('says what was not run', () => {
    const complain = vi.fn();
    count({ testResults: [file('failed', 'skipped')] }, complain);
    expect(complain.mock.calls.flat()).toEqual(['Not run: x.test.ts', 'Skipped, so not passed: a test']);
  });
});
