import type { Units } from '#shared/measure/units';
import { type Bit, bitAdvice } from '#shared/shop/bit';
import { formatSize } from '#shared/measure/length';
import { figureIn, figureOrNull, figureText, rateAfter, sizeAfter, sizeIn, sizeOrNull, sizeText } from './formText';

/** A bit as its form holds it: figures as typed. */
export interface BitForm {
  units: Units;
  name: string;
  diameter: string;
  measuredDiameter: string;
  flutes: string;
  cuttingLength: string;
  kind: Bit['kind'];
  upcutLength: string;
  colletDiameter: string;
  stickout: string;
  centreCutting: 'yes' | 'no';
  leastChip: string;
  mostChip: string;
  topSpeed: string;
}

export const newBit = (): BitForm => ({
  units: 'in', name: '', diameter: '', measuredDiameter: '', flutes: '2', cuttingLength: '', kind: 'straight', upcutLength: '', colletDiameter: '', stickout: '',
  centreCutting: 'no', leastChip: '', mostChip: '', topSpeed: '',
});

/** A kept bit as text to edit. */
export function bitForm({ units, name, diameter, measuredDiameter, flutes, cuttingLength, kind, upcutLength, colletDiameter, stickout, centreCutting, chipLoadRange, topSpeed }: Bit): BitForm {
  const size = (value: number | null) => sizeText(value, units);
  return {
    units, name, kind, diameter: size(diameter), measuredDiameter: size(measuredDiameter), flutes: String(flutes), cuttingLength: size(cuttingLength),
    upcutLength: size(upcutLength), colletDiameter: size(colletDiameter), stickout: size(stickout), centreCutting: centreCutting ? 'yes' : 'no',
    leastChip: figureText(chipLoadRange?.[0] ?? null), mostChip: figureText(chipLoadRange?.[1] ?? null), topSpeed: figureText(topSpeed),
  };
}

/** What the form asks the server to keep, for the bit's schema to judge. */
export function bitRequest(form: BitForm): unknown {
  const { units, name, kind, leastChip, mostChip } = form;
  const chips = leastChip.trim() !== '' || mostChip.trim() !== '';
  return {
    units, name, kind, diameter: sizeIn(form.diameter), measuredDiameter: sizeOrNull(form.measuredDiameter), flutes: figureIn(form.flutes),
    cuttingLength: sizeIn(form.cuttingLength), upcutLength: kind === 'compression' ? sizeOrNull(form.upcutLength) : null,
    colletDiameter: sizeIn(form.colletDiameter), stickout: sizeIn(form.stickout), centreCutting: form.centreCutting === 'yes',
    chipLoadRange: chips ? [figureIn(leastChip), figureIn(mostChip)] : null, topSpeed: figureOrNull(form.topSpeed),
  };
}

/** The form in other units: every size and chip load stays what it was. */
export function bitInUnits(form: BitForm, to: Units): BitForm {
  const size = (text: string) => sizeAfter(text, form.units, to);
  const rate = (text: string) => rateAfter(text, form.units, to);
  return {
    ...form, units: to, diameter: size(form.diameter), measuredDiameter: size(form.measuredDiameter), cuttingLength: size(form.cuttingLength),
    upcutLength: size(form.upcutLength), colletDiameter: size(form.colletDiameter), stickout: size(form.stickout), leastChip: rate(form.leastChip), mostChip: rate(form.mostChip),
  };
}

/** What to know of a bit's type in any slot; a compression bit's own first pass is judged with the slot it cuts. */
export function adviceOnBit({ units, kind, upcutLength }: Pick<Bit, 'units' | 'kind' | 'upcutLength'>): readonly string[] {
  if (kind !== 'compression') return bitAdvice({ units, kind, upcutLength }, { units, depth: 1, stepdown: 1 }).map(({ message }) => message);
  return upcutLength === null ? [] : [`A compression bit presses the lip down only above its up-cut part. Make the first pass deeper than ${formatSize(upcutLength, units)}, or the lip frays.`];
}
