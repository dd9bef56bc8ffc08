import type { Permission } from '@/lib/shared/permissions';

/** What can be done from anywhere, by whoever may. */
export const ACTIONS: readonly { label: string; href: string; permission: Permission }[] = [
  { label: 'Solve a new blend', href: '/blend', permission: 'blend.solve' },
  { label: 'Saved blends', href: '/blends', permission: 'blend.read' },
  { label: 'Add a material', href: '/materials/new', permission: 'material.write' },
  { label: 'Map by shared constituents', href: '/map?by=constituents', permission: 'map.read' },
  { label: 'Map as a table', href: '/map?view=table', permission: 'map.read' },
];
