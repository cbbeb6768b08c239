/** Who may ask for what; each may do what those before it may. */
export const ROLES = ['operator', 'engineer', 'supervisor', 'owner'] as const;
export type Role = (typeof ROLES)[number];

export const atLeast = (role: Role, needed: Role): boolean =>
  ROLES.indexOf(role) >= ROLES.indexOf(needed);

export const highest = (roles: readonly Role[]): Role =>
  roles.reduce((best, role) => (atLeast(role, best) ? role : best), 'operator');

/** A role as it was kept; what is no role any more is the least of them. */
export const roleOf = (kept: string): Role => ROLES.find((role) => role === kept) ?? 'operator';
