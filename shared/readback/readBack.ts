import type { ReadError, ReadProgram } from '../reader/motion';
import type { SlotSpec } from '../slot/spec';
import { layOnRail } from './cut';
import { type Finding, RULES, type Readback, type RuleName } from './finding';
import { depthsOfCut, entry, laps, retracts } from './rules/cutting';
import { chipLoad, feed, plungeFeed, spindle, spindleSpeed, travel } from './rules/machine';
import type { Rule } from './rules/rule';
import { clamps, end, modes, nut, rapids, start } from './rules/safety';
import { beside, cleared, depth, floor, length, outside, railWidthAssumed, stopMargin, under, width } from './rules/shape';

/** Rules that look at the whole cut, one finding each. */
const RULES_OF_A_CUT: readonly Rule[] = [
  length, width, depth, stopMargin, outside, cleared, floor, under, beside, entry, laps, retracts,
  start, rapids, clamps, nut, travel, modes, spindle, spindleSpeed, feed, plungeFeed, chipLoad, end,
];

/**
 * Measures a program, as read, against a slot spec: from its motions alone, with nothing of the plan that wrote it.
 *
 * @param assumesRailWidth true where nobody gave the rail's width: a caution, since Y is counted from its edge.
 * @returns findings in the order of `RULES`, and the worst of them.
 */
export function readBack(program: ReadProgram, spec: SlotSpec, assumesRailWidth: boolean): Readback {
  const cut = layOnRail(program, spec);
  const findings = [
    ...RULES_OF_A_CUT.flatMap((rule) => rule(cut) ?? []),
    ...depthsOfCut(cut),
    ...(assumesRailWidth ? [railWidthAssumed(cut)] : []),
  ];
  return verdictOf(findings);
}

/** The readback of a text that cannot be read: one finding that disagrees, where reading stopped. */
export function unreadable(error: ReadError): Readback {
  return verdictOf([
    { rule: 'read', severity: 'disagrees', at: error.at, point: null, quantity: 'words', wanted: null, measured: null, reason: error.reason },
  ]);
}

const ORDER = Object.fromEntries(RULES.map((rule, i) => [rule, i])) as Readonly<Record<RuleName, number>>;

function verdictOf(findings: readonly Finding[]): Readback {
  const sorted = [...findings].sort((a, b) => ORDER[a.rule] - ORDER[b.rule]);
  const has = (severity: Finding['severity']) => sorted.some((finding) => finding.severity === severity);
  return { verdict: has('disagrees') ? 'disagrees' : has('caution') ? 'caution' : 'agrees', findings: sorted };
}
