import { benchCutLength } from './cutLength';
import { benchCore } from './core';
import { benchHttp } from './http';
import { benchReader } from './readerVsParser';
import { benchScale } from './scale';

// Every figure here is a ratio or comes with one: absolute times belong to the machine they were taken on.

const reader = await benchReader();
console.log('\nReader against parser, 100 000 lines, medians of alternated runs');
console.table([{ 'whole interpretation, ms': round(reader.ours), 'splitting into words, ms': round(reader.theirs), 'times as fast': round(reader.ratio), 'at least': 3 }]);

console.log('\nPlan, write, read back: programs per second, and the share that each takes');
console.table(benchCore());

console.log('\nCut length against its bound (tests/support/soundCut/cutLength)');
console.table(benchCutLength());

console.log('\nPOST /api/programs against an empty route of the same server');
console.table([await benchHttp()]);

console.log('\nLists and look-ups with 100 000 programs and 1000 rails, against 100 and 10');
console.table(await benchScale());

function round(value: number): number {
  return Math.round(value * 100) / 100;
}
