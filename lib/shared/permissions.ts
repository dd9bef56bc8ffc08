/** Who may do what, as one table. A member holds one or several roles and may do what any of them may. */

export const ROLES = ['owner', 'perfumer', 'evaluator', 'buyer', 'safety', 'student'] as const;
export type Role = (typeof ROLES)[number];

const everyone: readonly Role[] = ROLES;

const TABLE = {
  'facet.read': everyone,
  'material.read': everyone,
  'material.write': ['owner', 'perfumer'],
  'map.read': everyone,
  /** What a material contains. */
  'constituent.read': ['owner', 'perfumer', 'evaluator', 'buyer', 'safety', 'student'],
  'constituent.write': ['owner', 'perfumer', 'safety'],
  'supplier.read': ['owner', 'perfumer', 'buyer', 'safety'],
  'price.read': ['owner', 'perfumer', 'buyer'],
  'price.write': ['owner', 'buyer', 'perfumer'],
  'limit.read': ['owner', 'perfumer', 'safety'],
  /** A saved blend is a formula: its proportions are the house's secret. */
  'blend.read': ['owner', 'perfumer', 'safety'],
  /** Solving shows proportions and prices. */
  'blend.solve': ['owner', 'perfumer'],
  'blend.save': ['owner', 'perfumer'],
} as const satisfies Record<string, readonly Role[]>;

export type Permission = keyof typeof TABLE;
export const PERMISSIONS = Object.keys(TABLE) as Permission[];

/** Whether any of these roles allows it. */
export function may(roles: readonly Role[], permission: Permission): boolean {
  const allowed: readonly Role[] = TABLE[permission];
  return roles.some((role) => allowed.includes(role));
}
