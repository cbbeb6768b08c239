/** Who may ask for what; each may do what those before it may. */
export const ROLES = ['operator', 'engineer', 'supervisor', 'owner'] as const;
export type Role = (typeof ROLES)[number];

export const atLeast = (role: Role, needed: Role): boolean =>
  ROLES.indexOf(role) >= ROLES.indexOf(needed);
