import type { LaboratoryKind } from '@/lib/schemas/laboratories';
import { streamFor } from '../story/random';
import type { MeasurandCode, Technique } from './methods';

export interface DemoLaboratory {
  /** Its place in the list, counted from 0. */
  number: number;
  name: string;
  kind: LaboratoryKind;
  town: string;
  technique: Technique;
}

type Entry = [name: string, kind: LaboratoryKind, town: string, technique: Technique];

const NAMED: readonly Entry[] = [
  ['Selkey Lock Terminal', 'grain-terminal', 'Selkey Lock', 'IAF'],
  ['Tolvers Quay Terminal', 'grain-terminal', 'Lirrowmouth', 'IAF'],
  ['Upper Lirrow Terminal', 'grain-terminal', 'Upper Lirrow', 'IAF'],
  ['Hollin Staithe Terminal', 'grain-terminal', 'Hollin', 'IAF'],
  ['Ashlode Staithe Terminal', 'grain-terminal', 'Ashlode', 'LFR'],
  ['Dunmarrow Silo', 'grain-terminal', 'Dunmarrow', 'LFR'],
  ['Garth Hill Grain Store', 'grain-terminal', 'Garth Hill', 'IAF'],
  ['Merewick Elevator', 'grain-terminal', 'Merewick', 'IAF'],
  ['Oxmere Mill', 'mill', 'Oxmere', 'LC-FLD'],
  ['Nether Wyle Mill', 'mill', 'Nether Wyle', 'ELISA'],
  ['Wendle Roller Mill', 'mill', 'Wendle', 'IAF'],
  ['Tarrow Weir Mill', 'mill', 'Tarrow Weir', 'ELISA'],
  ['Eastrow Maltings', 'mill', 'Eastrow', 'LC-FLD'],
  ['Kettlesing Flour', 'mill', 'Kettlesing Cross', 'ELISA'],
  ['Lirrowmouth Maize Mill', 'mill', 'Lirrowmouth', 'IAF'],
  ['Brackwater Feeds', 'feed-maker', 'Brackwater', 'IAF'],
  ['Marrick Vale Feeds', 'feed-maker', 'Marrick Vale', 'LC-MSMS'],
  ['Saltby Fold Feeds', 'feed-maker', 'Saltby Fold', 'ELISA'],
  ['Orrowby Premix', 'feed-maker', 'Orrowby', 'LC-MSMS'],
  ['Fennick Feed Works', 'feed-maker', 'Fennick', 'LFR'],
  ['Hathersall Poultry Feed', 'feed-maker', 'Hathersall', 'ELISA'],
  ['Pellow Dairy', 'dairy', 'Pellow', 'ELISA'],
  ['Vannet Creamery', 'dairy', 'Vannet', 'LC-FLD'],
  ['Quarrow Milk Drying', 'dairy', 'Quarrow', 'ELISA'],
  ['Three Fords Dairy', 'dairy', 'Three Fords', 'LC-FLD'],
  ['Lirrow Basin Public Laboratory', 'public', 'Lirrowmouth', 'LC-MSMS'],
  ['Highmarch Public Analyst', 'public', 'Highmarch', 'LC-MSMS'],
  ['Saltings Border Laboratory', 'public', 'Saltings', 'LC-MSMS'],
  ['Corrandale Analytical', 'contract', 'Corrandale', 'LC-MSMS'],
  ['Birchlow Testing', 'contract', 'Birchlow', 'LC-FLD'],
  ['Sevenoar Laboratories', 'contract', 'Sevenoar', 'LC-MSMS'],
  ['Dray and Tollund Testing', 'contract', 'Tollund Bank', 'LC-FLD'],
  ['Lirrow Agricultural College', 'other', 'Upper Lirrow', 'LC-FLD'],
];

const MORE_TOWNS =
  'Abbermoor Anstow Balderwyck Carrowby Cresmere Dallowick Elmersal Farrowdyke Gossamoor Harrowmere Inglewyke ' +
  'Jarrowfen Kelderby Lanterwick Mossarby Norrowell Ottermarch Pendlefen Quillmoor Rushmarrow Sandrowby Thornemere ' +
  'Underwyke Vallowby Wintermarch Yarrowfold Amberholt Brindlefen Cobblewyke Dimmerdale';

/** What a generated laboratory may be; each kind brings the techniques that are usual there. */
const MORE_KINDS: readonly [what: string, kind: LaboratoryKind, techniques: [Technique, ...Technique[]]][] = [
  ['Terminal', 'grain-terminal', ['IAF', 'IAF', 'LFR']],
  ['Mill', 'mill', ['ELISA', 'IAF', 'LC-FLD']],
  ['Feeds', 'feed-maker', ['ELISA', 'LC-MSMS', 'IAF', 'LFR']],
  ['Testing', 'contract', ['LC-MSMS', 'LC-FLD']],
  ['Grain Store', 'grain-terminal', ['IAF', 'LFR', 'ELISA']],
  ['Dairy', 'dairy', ['ELISA', 'LC-FLD']],
  ['Maltings', 'mill', ['LC-FLD', 'ELISA']],
  ['Premix', 'feed-maker', ['LC-MSMS', 'ELISA']],
  ['Public Analyst', 'public', ['LC-MSMS']],
  ['Seed Station', 'other', ['ELISA', 'LC-FLD']],
];

const TOWNS = MORE_TOWNS.split(' ');

export const FEWEST_LABORATORIES = NAMED.length;
export const MOST_LABORATORIES = NAMED.length + TOWNS.length * MORE_KINDS.length;

function generated(index: number): DemoLaboratory {
  const town = TOWNS[index % TOWNS.length];
  const made = MORE_KINDS[Math.floor(index / TOWNS.length)];
  if (!town || !made) throw new Error(`there is no laboratory ${index}`);
  const [what, kind, techniques] = made;
  const name = `${town} ${what}`;
  const technique = streamFor('technique', name).pick(techniques);
  return { number: NAMED.length + index, name, kind, town, technique };
}

/** The named laboratories, each with its part in the story, and as many more as are asked for. */
export function demoLaboratories(count: number): DemoLaboratory[] {
  const named = NAMED.map(([name, kind, town, technique], number) => ({
    number,
    name,
    kind,
    town,
    technique,
  }));
  const more = Array.from({ length: count - named.length }, (_, index) => generated(index));
  return [...named, ...more];
}

const SCOPES: Record<LaboratoryKind, readonly MeasurandCode[]> = {
  'grain-terminal': ['AFT', 'FUM', 'DON', 'ZEN'],
  mill: ['AFB1', 'AFT', 'FUM', 'DON', 'ZEN', 'OTA'],
  'feed-maker': ['AFB1', 'AFT', 'FUM', 'DON', 'ZEN', 'OTA'],
  dairy: ['AFB1', 'AFT', 'AFM1'],
  public: ['AFB1', 'AFT', 'FUM', 'DON', 'ZEN', 'OTA', 'AFM1'],
  contract: ['AFB1', 'AFT', 'FUM', 'DON', 'ZEN', 'OTA', 'AFM1'],
  other: ['AFB1', 'AFT', 'FUM', 'DON', 'ZEN', 'OTA', 'AFM1'],
};

/** What laboratories of a kind measure; the rest of a plan they leave out of their files. */
export function scopeOf(laboratory: DemoLaboratory): readonly MeasurandCode[] {
  return SCOPES[laboratory.kind];
}
