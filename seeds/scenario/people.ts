import { PROVIDER_ROLES, type LaboratoryRole, type ProviderRole } from '@/lib/rules/roles';
import { slugify } from '@/lib/slug';
import type { DemoLaboratory } from './laboratories';

type DemoRole = ProviderRole | LaboratoryRole;

/** For the demonstration only: everyone of a role has the same one, and it is printed in the open. */
export const PASSWORDS: Readonly<Record<DemoRole, string>> = {
  administrator: 'granite lantern harbour thistle',
  coordinator: 'copper meadow willow ferry',
  reviewer: 'violet anchor saddle barley',
  lab_manager: 'orchard pebble kettle linen',
  analyst: 'maple beacon thimble river',
};

export interface DemoPerson {
  name: string;
  email: string;
  /** The role whose password opens the account. */
  role: DemoRole;
}

const PROVIDER_DOMAIN = 'lirrow-office.example';

export const ADMINISTRATOR = provider('administrator', 'Ottilie Brask');
export const COORDINATORS = [
  provider('coordinator', 'Maren Dovecote'),
  provider('coordinator', 'Silas Wetherlam'),
] as const;
export const REVIEWERS = [
  provider('reviewer', 'Ingrid Halloway-Voss'),
  provider('reviewer', 'Tobias Rennick'),
] as const;

/** Analyst at one laboratory and manager at another. */
export const SHARED_ANALYST = {
  name: 'Perpetua Lisle',
  email: 'perpetua.lisle@lirrow-freelance.example',
  role: 'analyst',
  analystAt: 'Tolvers Quay Terminal',
  managerAt: 'Upper Lirrow Terminal',
} as const;

/** Laboratories whose people are listed among the sign-ins; each stands for a page worth seeing. */
export const LISTED_LABORATORIES = [
  'Hollin Staithe Terminal',
  'Selkey Lock Terminal',
  'Brackwater Feeds',
  'Oxmere Mill',
  'Pellow Dairy',
  'Lirrow Basin Public Laboratory',
];

const GIVEN: [string, ...string[]] = [
  'Agnes',
  'Bertil',
  'Cosima',
  'Darragh',
  'Elspeth',
  'Florian',
  'Greta',
  'Hamish',
  'Ilse',
  'Joris',
  'Katya',
  'Lorcan',
  'Mirela',
  'Niall',
  'Odile',
  'Piers',
  'Rosalind',
  'Stellan',
  'Tamsin',
  'Ulrik',
  'Verena',
  'Wystan',
  'Ysolde',
  'Zoltan',
];
const FAMILY: [string, ...string[]] = [
  'Arkwell',
  'Bellinder',
  'Corvane',
  'Dunnock',
  'Emberley',
  'Fosswick',
  'Garrowby',
  'Hexam',
  'Inglethorn',
  'Jessamy',
  'Kestrel',
  'Lorrimer',
  'Marchbank',
  'Nettleship',
  'Oakhanger',
  'Pemberlow',
  'Quillon',
  'Ravensby',
  'Sallowfield',
  'Tregarrow',
  'Umberlain',
  'Venning',
  'Wolder',
  'Yarnfold',
];

function provider(role: (typeof PROVIDER_ROLES)[number], name: string): DemoPerson {
  return { name, role, email: `${slugify(name).replace('-', '.')}@${PROVIDER_DOMAIN}` };
}

export function domainOf(laboratory: DemoLaboratory): string {
  return `${slugify(laboratory.name)}.example`;
}

/** The steps are prime to the 24 names of each list, so that 576 people pass before a name comes again. */
function nameOf(number: number): { given: string; family: string } {
  const given = GIVEN[(7 * number) % GIVEN.length] ?? GIVEN[0];
  const family = FAMILY[(5 * number + Math.floor(number / GIVEN.length)) % FAMILY.length] ?? FAMILY[0];
  return { given, family };
}

/** The manager and the analyst of a laboratory. */
export function staffOf(laboratory: DemoLaboratory): Record<LaboratoryRole, DemoPerson> {
  const person = (role: LaboratoryRole, number: number): DemoPerson => {
    const { given, family } = nameOf(number);
    const email = `${slugify(given)}.${slugify(family)}@${domainOf(laboratory)}`;
    return { name: `${given} ${family}`, email, role };
  };
  const first = 2 * laboratory.number;
  return { lab_manager: person('lab_manager', first), analyst: person('analyst', first + 1) };
}
