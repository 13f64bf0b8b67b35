import { readFileSync, readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { type Finding, RULES, type Readback, type RuleName, type Severity } from '#shared/readback/finding';
import { readBack, unreadable } from '#shared/readback/readBack';
import { sentenceOf } from '#shared/readback/sentences';
import { readProgram } from '#shared/reader/index';
import { judgeCut } from '../../support/soundCut/index';
import { asked } from '../slot/asking';

const fixture = (file: string) => readFileSync(new URL(`../../../fixtures/refused/${file}`, import.meta.url), 'utf8');
const files = readdirSync(new URL('../../../fixtures/refused/', import.meta.url));

/** Reads a program as it stands and measures it against a raw spec. */
function measure(text: string, raw: object): Readback {
  const { spec, assumed } = asked(raw);
  const read = readProgram(text);
  return read.ok ? readBack(read.program, spec, assumed.includes('railWidth')) : unreadable(read.error);
}

function measureFixture(name: string): Readback {
  return measure(fixture(`${name}.nc`), JSON.parse(fixture(`${name}.json`)) as object);
}

const found = (readback: Readback, rule: RuleName): Finding[] => readback.findings.filter((finding) => finding.rule === rule);

/** What fixtures/refused/<rule>.nc is found out for; figures are those of its second comment. */
const FIRES: Readonly<Record<RuleName, { readonly severity: Severity; readonly line: number; readonly measured?: unknown; readonly reason?: string }>> = {
  read: { severity: 'disagrees', line: 12 },
  length: { severity: 'disagrees', line: 13, measured: 16.499 },
  width: { severity: 'disagrees', line: 14, measured: 0.499 },
  depth: { severity: 'disagrees', line: 18, measured: 0.1885 },
  stopMargin: { severity: 'disagrees', line: 13, measured: [1.251, 1.249] },
  outside: { severity: 'disagrees', line: 22, measured: 0.001 },
  cleared: { severity: 'disagrees', line: 25, measured: 'not all' },
  floor: { severity: 'disagrees', line: 20, measured: 0.0008 },
  under: { severity: 'disagrees', line: 18, measured: 0.55 },
  beside: { severity: 'disagrees', line: 14, measured: [0.626, 0.624] },
  railWidth: { severity: 'caution', line: 1, measured: 1.5, reason: 'assumed' },
  passDepth: { severity: 'disagrees', line: 12, measured: 0.0948 },
  cuttingLength: { severity: 'caution', line: 12, measured: 0.1875, reason: 'shank' },
  entry: { severity: 'disagrees', line: 12 },
  laps: { severity: 'disagrees', line: 13, measured: 'conventional' },
  retracts: { severity: 'disagrees', line: 26, measured: 2 },
  start: { severity: 'disagrees', line: 9 },
  rapids: { severity: 'disagrees', line: 12, measured: 0.2 },
  clamps: { severity: 'disagrees', line: 11, measured: -0.075 },
  nut: { severity: 'disagrees', line: 18, measured: -0.05 },
  travel: { severity: 'disagrees', line: 1, measured: [17.625, 1, 0.9375] },
  modes: { severity: 'disagrees', line: 7, measured: 'G54' },
  spindle: { severity: 'disagrees', line: 24, reason: 'changesLow' },
  spindleSpeed: { severity: 'disagrees', line: 12, measured: 15000 },
  feed: { severity: 'disagrees', line: 13, measured: 101 },
  plungeFeed: { severity: 'disagrees', line: 12, measured: 30 },
  chipLoad: { severity: 'caution', line: 12, measured: 0.001875, reason: 'rubs' },
  end: { severity: 'disagrees', line: 25, measured: 0.75, reason: 'noEnd' },
};

describe.each(RULES)('rule %s', (rule) => {
  const wanted = FIRES[rule];

  it('has a program that fires it', () => {
    expect(files).toEqual(expect.arrayContaining([`${rule}.nc`, `${rule}.json`]));
    const findings = found(measureFixture(rule), rule);
    expect(findings).toHaveLength(1);
    const [finding] = findings;
    expect(finding?.severity).toBe(wanted.severity);
    if (wanted.reason !== undefined) expect(finding?.reason).toBe(wanted.reason);
    const figures = (value: unknown): unknown => (Array.isArray(value) ? value.map(figures) : typeof value === 'number' ? expect.closeTo(value, 6) : value);
    if (wanted.measured !== undefined) expect(finding?.measured).toEqual(figures(wanted.measured));
  });

  it('says where in the text', () => {
    expect(found(measureFixture(rule), rule)[0]?.at.line).toBe(wanted.line);
  });

  it('has a program that does not', () => {
    const findings = found(measureFixture('sound'), rule);
    // A text that can be read and a rail width that was given leave nothing to say.
    const silent = rule === 'read' || rule === 'railWidth';
    expect(findings.map(({ severity }) => severity)).toEqual(silent ? [] : ['agrees']);
  });

  it('is told in words with what to do', () => {
    for (const finding of found(measureFixture(rule), rule)) {
      const { text, cure, header } = sentenceOf(finding, 'in');
      expect(text).not.toBe('');
      expect(cure).toMatch(/\.$/);
      expect(header === null).toBe(finding.severity !== 'caution');
    }
  });
});

describe('the folder of refused programs', () => {
  it('has a program and a spec for each rule and one sound one, and nothing else', () => {
    expect([...files].sort()).toEqual([...RULES, 'sound'].flatMap((name) => [`${name}.json`, `${name}.nc`]).sort());
  });

  it('has a sound one that the independent judge finds nothing in but its own comment', () => {
    const spec = asked(JSON.parse(fixture('sound.json')) as object).spec;
    expect(judgeCut(fixture('sound.nc'), spec).map(({ rule }) => rule)).toEqual(['mark']);
    expect(measureFixture('sound').verdict).toBe('agrees');
  });
});

describe('the verdict', () => {
  it('is the worst of all findings', () => {
    for (const rule of RULES) {
      const { verdict, findings } = measureFixture(rule);
      const severities = new Set(findings.map(({ severity }) => severity));
      expect(verdict).toBe(severities.has('disagrees') ? 'disagrees' : severities.has('caution') ? 'caution' : 'agrees');
    }
  });

  it('keeps the order in which the rules are shown', () => {
    for (const rule of RULES) {
      const order = measureFixture(rule).findings.map((finding) => RULES.indexOf(finding.rule));
      expect(order).toEqual([...order].sort((a, b) => a - b));
    }
  });

  it('of a text that cannot be read is one finding that disagrees, at the place and with the reason', () => {
    const read = readProgram('G20\nG90 G1 X#1\nM30\n');
    expect(read.ok).toBe(false);
    const { verdict, findings } = unreadable(read.ok ? { code: 'noEnd', at: { line: 0, column: 0 }, reason: '' } : read.error);
    expect(verdict).toBe('disagrees');
    expect(findings).toEqual([expect.objectContaining({ rule: 'read', severity: 'disagrees', at: { line: 2, column: 9 }, measured: null })]);
    expect(findings[0]?.reason).toMatch(/[Pp]arameter/);
  });
});
