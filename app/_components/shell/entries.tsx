import type { ReactNode } from 'react';
import type { Permission } from '@/lib/shared/permissions';

export interface RailEntry {
  href: string;
  name: string;
  permission: Permission;
  /** Drawn with one line, on 20 x 20. */
  drawing: ReactNode;
}

/** The screens in the order of the work. An entry is added here when its screen works. */
export const ENTRIES: readonly RailEntry[] = [
  {
    href: '/materials',
    name: 'Materials',
    permission: 'material.read',
    drawing: (
      <path d="M3 17V6a1.5 1.5 0 0 1 3 0v11ZM8.5 17V4a1.5 1.5 0 0 1 3 0v13ZM14 17V7.500a1.5 1.5 0 0 1 3 0V17ZM3 10.500h3M8.5 9h3M14 12h3" />
    ),
  },
  {
    href: '/map',
    name: 'Map',
    permission: 'map.read',
    drawing: (
      <path d="M7.2 6 13 7.500M6 8l2.5 5.500M14.5 9.800l-3.6 4M5 7.500a2 2 0 1 1 .01 0ZM15 10a2 2 0 1 1 .01 0ZM9.5 17.500a2 2 0 1 1 .01 0Z" />
    ),
  },
  {
    href: '/blend',
    name: 'Blend',
    permission: 'blend.solve',
    drawing: (
      <path d="M8 2.500h4M9 2.500V8l-5 8.200a.9.9 0 0 0 .8 1.300h10.400a.9.9 0 0 0 .8-1.300L11 8V2.500M6.2 12.500h7.6" />
    ),
  },
  {
    href: '/blends',
    name: 'Saved blends',
    permission: 'blend.read',
    drawing: <path d="M4 2.500h9l3 3V17.500H4ZM13 2.500v3h3M7 9.500h6M7 12.500h6M7 15h3" />,
  },
];

export function Drawing({ children }: { children: ReactNode }) {
  return (
    <svg
      viewBox="0 0 20 20"
      width="20"
      height="20"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.25"
      strokeLinejoin="round"
      strokeLinecap="round"
      aria-hidden="true"
      className="flex-none"
    >
      {children}
    </svg>
  );
}
