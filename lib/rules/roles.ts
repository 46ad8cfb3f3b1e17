export const PROVIDER_ROLES = ['administrator', 'coordinator', 'reviewer'] as const;
export const LABORATORY_ROLES = ['lab_manager', 'analyst'] as const;

export type ProviderRole = (typeof PROVIDER_ROLES)[number];
export type LaboratoryRole = (typeof LABORATORY_ROLES)[number];
export type Role = ProviderRole | LaboratoryRole;

export const ROLE_NAMES: Record<Role, string> = {
  administrator: 'Administrator',
  coordinator: 'Coordinator',
  reviewer: 'Reviewer',
  lab_manager: 'Laboratory manager',
  analyst: 'Analyst',
};

export interface Membership {
  role: Role;
  laboratoryId: number | null;
  laboratoryName: string | null;
}

/** Whoever asks: a signed-in person, with every role held, or a laboratory's own program with its token. */
export interface Actor {
  userId: number | null;
  apiTokenId: number | null;
  name: string;
  email: string;
  memberships: readonly Membership[];
  /** The laboratory the person works for at the moment; null for provider staff without one. */
  laboratoryId: number | null;
}
