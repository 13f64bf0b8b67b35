import type { Units } from '#shared/measure/units';
import type { OwnWood } from '#shared/shop/wood';
import { figureIn, rateAfter, sizeAfter, sizeIn, sizeText } from './formText';

/** A wood of the shop's own as its form holds it: figures as typed. */
export interface WoodForm {
  units: Units;
  name: string;
  kind: OwnWood['kind'];
  chipLoads: ChipLoadForm[];
  dustCaution: string;
  moves: 'yes' | 'no';
}
export interface ChipLoadForm {
  diameter: string;
  least: string;
  most: string;
}

/** Kinds of an own wood as a form and a list call them. */
export const OWN_KIND_WORDS = { hardwood: 'Hardwood', softwood: 'Softwood', sheet: 'Sheet goods' } as const satisfies Record<OwnWood['kind'], string>;

export const newChipLoad = (): ChipLoadForm => ({ diameter: '', least: '', most: '' });
export const newWood = (): WoodForm => ({ units: 'in', name: '', kind: 'hardwood', chipLoads: [], dustCaution: '', moves: 'yes' });

/** A kept wood as text to edit. */
export const woodForm = ({ units, name, kind, chipLoads, dustCaution, movesSeasonally }: OwnWood): WoodForm => ({
  units, name, kind, dustCaution: dustCaution ?? '', moves: movesSeasonally ? 'yes' : 'no',
  chipLoads: chipLoads.map(({ diameter, least, most }) => ({ diameter: sizeText(diameter, units), least: String(least), most: String(most) })),
});

/** What the form asks the server to keep, for the wood's schema to judge. */
export const woodRequest = ({ units, name, kind, chipLoads, dustCaution, moves }: WoodForm): unknown => ({
  units, name, kind, dustCaution: dustCaution.trim() || null, movesSeasonally: moves === 'yes',
  chipLoads: chipLoads.map(({ diameter, least, most }) => ({ diameter: sizeIn(diameter), least: figureIn(least), most: figureIn(most) })),
});

/** The form in other units: every diameter and chip load stays what it was. */
export const woodInUnits = (form: WoodForm, to: Units): WoodForm => ({
  ...form, units: to,
  chipLoads: form.chipLoads.map(({ diameter, least, most }) => ({
    diameter: sizeAfter(diameter, form.units, to), least: rateAfter(least, form.units, to), most: rateAfter(most, form.units, to),
  })),
});
