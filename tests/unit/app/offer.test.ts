import { describe, expect, test } from 'vitest';
import { makeProgram } from '#shared/makeProgram';
import { slotRequestSchema } from '#shared/slot/request';
import { type Draft, type TextKey, FIRST_DRAFT, withPick, withText } from '../../../app/utils/draft';
import { type Offer, offerForFinding, offerForProblem } from '../../../app/utils/offer';
import { problemsOf } from '../../../app/utils/problems';
import { rawRequestOf } from '../../../app/utils/rawRequest';

const typed = (texts: { readonly [Key in TextKey]?: string }, from: Draft = FIRST_DRAFT): Draft =>
  Object.entries(texts).reduce((draft, [key, text]) => withText(draft, key as TextKey, text), from);
const MM: Draft = { ...FIRST_DRAFT, figures: 'mm' };

function problems(draft: Draft) {
  const parsed = slotRequestSchema.safeParse(rawRequestOf(draft));
  return problemsOf(draft, parsed.success ? [] : parsed.error.issues);
}
function offersOf(draft: Draft): Offer[] {
  return Object.entries(problems(draft)).flatMap(([key, messages]) => messages.flatMap((message) => offerForProblem(draft, key, message) ?? []));
}

describe('what a refusal offers', () => {
  test.each<[string, Draft, string, string]>([
    ['a bit wider than the slot is set to the slot width', typed({ bitDiameter: '1/2' }), 'bitDiameter', '3/8'],
    ['a stepdown over the advised one is set to it', typed({ stepdown: '3/16' }), 'stepdown', '1/8'],
    ['a stop margin too short for a coin is set to the least', typed({ stopMargin: '1/8' }), 'stopMargin', '1/4'],
    ['a safe height among the clamps is raised', typed({ safeHeight: '1/4' }), 'safeHeight', '5/8'],
    ['a slot too deep for its rail', typed({ depth: '0.7' }), 'depth', '5/8'],
    ['a rail too narrow for its slot', typed({ railWidth: '7/16' }), 'railWidth', '1/2'],
    ['an allowance wider than the room beside the bit', typed({ finishAllowance: '1/8' }), 'finishAllowance', '1/16'],
    ['a feed above the machine\'s', typed({ 'machine.topFeed': '80' }), 'feed', '80'],
    ['millimetres stay millimetres', typed({ stopMargin: '4' }, MM), 'stopMargin', '6'],
  ])('%s, and that cures it', (_name, draft, field, text) => {
    const offer = offersOf(draft).find((one) => one.field === field);
    expect(offer?.text).toBe(text);
    expect(offer?.words).toMatch(new RegExp(`^Set the .+ to ${text}$`));
    if (offer) expect(problems(withText(draft, offer.field, offer.text))[field]).toBeUndefined();
  });

  test('a limit that was rounded in its sentence is not passed', () => {
    const draft = typed({ width: '0.33333333', bitDiameter: '0.5' });
    const offer = offersOf(draft).find(({ field }) => field === 'bitDiameter');
    expect(offer?.text).toBe('0.3332');
  });

  test('nothing is offered where no one figure is named', () => {
    expect(offersOf(typed({ depth: 'deep' }))).toEqual([]);
    expect(offerForProblem(FIRST_DRAFT, 'machine', 'Use 3 in or less')).toBeNull();
    expect(offerForProblem(FIRST_DRAFT, 'depth', 'Use 1/100 in to 240 in.')).toBeNull();
  });
});

function readingsOf(draft: Draft) {
  const made = makeProgram(slotRequestSchema.parse(rawRequestOf(draft)));
  return { made, offers: made.readback.findings.flatMap((finding) => {
    const offer = offerForFinding(draft, finding, made.spec);
    return offer ? [{ rule: finding.rule, offer }] : [];
  }) };
}

describe('what a reading that is off offers', () => {
  test('nothing where everything agrees', () => {
    const { offers, made } = readingsOf(FIRST_DRAFT);
    expect(made.readback.findings.some(({ severity }) => severity === 'disagrees')).toBe(false);
    expect(offers.every(({ rule }) => made.readback.findings.some((one) => one.rule === rule && one.severity === 'caution'))).toBe(true);
  });

  test.each<[string, Draft, string, string, string]>([
    ['a feed at which the bit rubs', typed({ feed: '20' }), 'chipLoad', 'feed', ''],
    ['a feed too heavy for its teeth', typed({ feed: '900' }), 'chipLoad', 'feed', ''],
    ['a slot as wide as its bit cuts', typed({ width: '0.252' }), 'width', 'width', '1/4'],
    ['a slot deeper than the bit\'s flutes', typed({ cuttingLength: '1/8' }), 'cuttingLength', 'depth', '1/8'],
  ])('%s: one box cures it', (_name, draft, rule, field, text) => {
    const found = readingsOf(draft).offers.find((one) => one.rule === rule);
    expect(found?.offer.field).toBe(field);
    if (text) expect(found?.offer.text).toBe(text);
    if (!found) return;
    const after = readingsOf(withText(draft, found.offer.field, found.offer.text)).made.readback.findings.find((one) => one.rule === rule);
    expect(after?.severity).toBe('agrees');
  });

  test('a rail width that nobody measured is not offered: only a rule can say it', () => {
    expect(readingsOf(typed({ railWidth: '' })).offers.map(({ rule }) => rule)).not.toContain('railWidth');
    expect(readingsOf(withPick(FIRST_DRAFT, 'wood', 'pine')).offers.map(({ rule }) => rule)).not.toContain('railWidth');
  });
});
