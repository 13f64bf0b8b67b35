import { describe, expect, it } from 'vitest';
import { slotRequestSchema } from '#shared/slot/request';
import { FIRST_DRAFT, type Draft, withText } from '../../../app/utils/draft';
import { allProblems, namedProblem, problemsOf, sizeWords } from '../../../app/utils/problems';
import { rawRequestOf } from '../../../app/utils/rawRequest';

function of(draft: Draft) {
  const parsed = slotRequestSchema.safeParse(rawRequestOf(draft));
  return problemsOf(draft, parsed.success ? [] : parsed.error.issues);
}

describe('problems stand beside the box they are about', () => {
  it('a sound draft has none', () => expect(of(FIRST_DRAFT)).toEqual({}));

  it('a text that is no size is said once, at its own box, with what would work', () => {
    const problems = of(withText(FIRST_DRAFT, 'width', 'wide'));
    expect(problems.width).toEqual(['That is not a size we can read. Try 26 1/4, 0.375 or 9 mm.']);
  });

  it('what follows is not called missing while one it follows cannot be read', () => {
    const problems = of(withText(FIRST_DRAFT, 'railLength', '26 1/'));
    expect(Object.keys(problems)).toEqual(['railLength']);
    expect(Object.keys(of(withText(FIRST_DRAFT, 'railLength', '')))).toEqual(['railLength']);
    expect(of(withText(FIRST_DRAFT, 'railLength', '')).railLength?.[0]).toMatch(/^Rail length is missing\. Try /);
  });

  it("takes the schema's own sentences by their path", () => {
    const problems = problemsOf(FIRST_DRAFT, [{ path: ['machine', 'travel', 'x'], message: 'too short' }, { path: ['machine', 'travel', 'x'], message: 'too short' }]);
    expect(problems).toEqual({ 'machine.travel.x': ['too short'] });
  });

  it('away from its box a sentence names it', () => {
    const [only, ...others] = allProblems(of(withText(FIRST_DRAFT, 'stopMargin', 'x')));
    expect(others).toEqual([]);
    expect(only).toEqual({ key: 'stopMargin', message: expect.stringMatching(/^Stop margin: That is not a size/) });
    expect(namedProblem('feed', 'give a feed.')).toBe('Give a feed.');
    expect(sizeWords('railLength')).toBe('rail length');
  });
});
