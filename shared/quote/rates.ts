import { z } from 'zod';
import { objectError } from '../measure/messages';
import type { MoneySettings } from '../money/format';
import { moneyField, percentField } from '../money/fields';
import { choiceField, figureField, nameField, wrong } from '../shop/fields';
import { COUNTED_BY, LABOUR_STEPS, USUAL_LABOUR } from './labour';

const MOST_HOURLY = 1e8; // minor units an hour: beyond any shop in any currency
const MOST_MINUTES = 2400; // a working week for one of anything
const MOST_RATES = 30; // lines of the shop's labour table

/** A tax as the shop charges it: its name on the paper and its percentage. */
export const taxSchema = z.strictObject({
  name: nameField("the tax's name").default('Tax'),
  percent: percentField('tax', 0, 50),
}, { error: objectError('the tax as an object with name and percent') });

/** What a shop reckons its prices with. Amounts are text as typed or whole minor units. */
export function ratesSchema(settings: MoneySettings) {
  const hourly = (words: string) => moneyField(words, settings, { most: MOST_HOURLY });
  return z.strictObject({
    machineHourly: hourly('price of a machine hour'),
    labourHourly: hourly('price of an hour of work'),
    labour: z.array(z.strictObject({
      step: choiceField('step', LABOUR_STEPS),
      minutes: figureField('minutes', 0, MOST_MINUTES, 'minutes'),
      per: choiceField('what minutes are counted by', COUNTED_BY),
    }, { error: objectError('each step as an object with step, minutes and per') }), { error: wrong('steps of work', 'Use a list.') })
      .max(MOST_RATES, { error: `There are more than ${MOST_RATES} steps of work. Use ${MOST_RATES} or fewer.` })
      .default(() => [...USUAL_LABOUR]),
    overheadPercent: percentField('overhead', 0, 300),
    /** A share of the price: at 100 there would be no price high enough. */
    marginPercent: percentField('margin', 0, 95),
    rushPercent: percentField('rush', 0, 200),
    depositPercent: percentField('deposit', 0, 100),
    tax: taxSchema,
  }, { error: objectError("the shop's rates as one object") });
}

export type Rates = z.output<ReturnType<typeof ratesSchema>>;
export type RatesInput = z.input<ReturnType<typeof ratesSchema>>;
