import { assert } from '#shared/assert';
import { DEMO_BITS, DEMO_MACHINE, DEMO_RAILS } from '#server/demo/scenario';
import { makeProgram } from '#shared/makeProgram';
import type { BenchProgram } from '#shared/shop/bench';
import { bitSchema } from '#shared/shop/bit';
import { prepareRail } from '#shared/shop/forMachine';
import { machineSchema } from '#shared/shop/machine';

/** A program of the demo shop as the bench is given it: its rail by number, held in one of the machine's ways. */
export function benchProgramOf(rail = 0, held = 2): BenchProgram {
  const [machine, bit] = [machineSchema.parse(DEMO_MACHINE), bitSchema.parse(DEMO_BITS[0])];
  const holding = machine.holdings[held];
  const drawn = DEMO_RAILS[rail];
  assert(holding !== undefined && drawn !== undefined, 'the demo has this rail and this way of holding');
  const prepared = prepareRail(drawn.request, { machine, bit: { ...bit, acceptedDiameter: null }, holding, wood: null });
  assert(prepared.ok, "the demo's rails can be cut");
  const made = makeProgram(prepared.request);
  assert(made.ok, "the demo's programs agree with their drawings");
  const { mark, fileName, program: text, sha256, spec, summary, readback } = made;
  const cautions = readback.findings.filter(({ severity }) => severity === 'caution');
  return { id: `program-${rail}`, mark, fileName, text, sha256, revision: 1, spec, summary, cautions, machine, bit, holding };
}
