import { describe, expect, it } from 'vitest';
import { slotRequestSchema } from '#shared/slot/request';
import { FIRST_DRAFT, type TextKey, withPick, withText } from '../../../app/utils/draft';
import { rawRequestOf } from '../../../app/utils/rawRequest';

const typed = (texts: Readonly<Partial<Record<TextKey, string>>>) =>
  Object.entries(texts).reduce((draft, [key, text]) => ({ ...draft, texts: { ...draft.texts, [key]: { text, units: 'in' } } }), FIRST_DRAFT);

describe('the request a draft stands for', () => {
  it('is what anyone would post: texts as typed, numbers as numbers, the follower worked out, nothing left open', () => {
    expect(rawRequestOf(FIRST_DRAFT)).toEqual({
      units: 'in', length: 24.5, stopMargin: '7/8', width: '3/8', depth: '3/16', railWidth: '1 1/4', railThickness: '3/4', bitDiameter: '1/4',
      stepdown: '3/32', flutes: 2, spindleSpeed: 16000, feed: 100, plungeFeed: 25, wood: 'white-oak',
    });
  });

  it('names the unit of each text once the drawing is in the other, and stands for the same rail', () => {
    const raw = rawRequestOf({ ...FIRST_DRAFT, figures: 'mm' });
    expect(raw).toMatchObject({ units: 'mm', width: '3/8 in', stopMargin: '7/8 in', feed: 2540 });
    const parsed = slotRequestSchema.parse(raw);
    expect(parsed.spec.width).toBeCloseTo(9.525, 9);
    expect(parsed.spec.length).toBeCloseTo(622.3, 9);
  });

  it('builds what lies deeper from dotted names; an open half of a pair is null for the schema to name', () => {
    const draft = withPick(withPick(typed({
      'machine.travel.x': '32', 'machine.travel.y': '32', 'machine.travel.z': '4', 'machine.spindleRange.1': '24000', 'chipLoadRange.0': '0.002', 'chipLoadRange.1': '0.005', 'options.fileEnding': ' tap ',
    }), 'machine.heavy', 'true'), 'options.percent', 'false');
    expect(rawRequestOf(draft)).toMatchObject({
      machine: { travel: { x: 32, y: 32, z: 4 }, spindleRange: [null, 24000], heavy: true }, chipLoadRange: [0.002, 0.005], options: { fileEnding: 'tap', percent: false },
    });
    expect(slotRequestSchema.safeParse(rawRequestOf(draft)).success).toBe(false);
  });

  it('hands on a number that cannot be read as its text, so that the refusal can quote it', () => {
    expect(rawRequestOf(withText(FIRST_DRAFT, 'feed', 'fast'))).toMatchObject({ feed: 'fast' });
    expect(rawRequestOf(withText(FIRST_DRAFT, 'stopMargin', ''))).not.toHaveProperty('stopMargin');
    expect(rawRequestOf(withText(FIRST_DRAFT, 'stopMargin', ''))).not.toHaveProperty('length');
  });

  it('a held slot length is sent as typed, and the stop margin that follows as a number', () => {
    const raw = rawRequestOf(withText(withText(FIRST_DRAFT, 'railLength', '20'), 'length', '18 1/4'));
    expect(raw).toMatchObject({ length: '18 1/4', stopMargin: 0.875 });
  });
});
