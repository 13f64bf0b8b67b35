import type { SlotRequestInput } from '../slot/request';
import { slotOfRail } from '../piece/arrange';
import { placeRails } from '../piece/rails';
import { byUnits } from '../measure/units';
import type { Work } from './work';

/** The bit a rail is drawn with until it is put on a machine with another: the usual quarter inch or 6 mm, or the widest usual one that the groove takes; common practice, no source. */
const BITS = { in: [0.25, 0.1875, 0.125, 0.0625], mm: [6, 5, 3, 2] } as const;
/** Pass depth as a share of the bit: 3/32 with a quarter inch; common practice, no source. */
const STEPDOWN = 3 / 8;

const tidy = (length: number) => Number(length.toFixed(6)); // sums of decimals miss by a few binary places

/** The rails of a piece as programs are asked for: each with its label. The shop's machine and bit come on top later. */
export function railRequests(work: Work, name: string): { readonly label: string; readonly request: SlotRequestInput }[] {
  const { piece, build } = work;
  const { units, section } = piece;
  const bit = BITS[units].find((each) => each <= section.grooveWidth) ?? byUnits(units, 0.0625, 2);
  return placeRails(piece).map((rail) => {
    const slot = slotOfRail(piece, rail);
    return {
      label: rail.name,
      request: {
        ...slot, length: tidy(slot.length), name: `${name.slice(0, 48)}, rail ${rail.name}`, wood: build.rails, bitDiameter: bit, stepdown: tidy(Math.min(bit * STEPDOWN, slot.depth)),
      },
    };
  });
}
