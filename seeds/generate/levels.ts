import type { MeasurandCode } from '../scenario/methods';
import type { DemoRound } from '../scenario/rounds';
import { streamFor } from '../story/random';

/** Total aflatoxins over aflatoxin B1 in the invented maize. */
const AFT_OVER_AFB1 = 1.28;

/** The level of a measurand in an item, ug/kg, as no one in the story knows it. */
export function trueLevel(round: DemoRound, item: string, measurand: MeasurandCode): number {
  const given = round.levels[`${item} ${measurand}`];
  if (given !== undefined) return given;
  const planned = round.items.find((entry) => entry.code === item)?.measurands;
  if (measurand === 'AFT' && planned?.AFB1) return AFT_OVER_AFB1 * trueLevel(round, item, 'AFB1');
  const range = planned?.[measurand];
  if (!range) throw new Error(`${round.slug} has no ${measurand} in ${item}`);
  return streamFor('level', round.slug, item, measurand).between(...range);
}
