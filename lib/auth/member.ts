import 'server-only';
import { Forbidden } from '@/lib/errors';
import { may, type Permission, type Role } from '@/lib/shared/permissions';

/** Who asks, in which house, with which roles. Only lib/auth makes one; every query and command takes it first. */
export interface Member {
  readonly teamId: string;
  readonly teamName: string;
  readonly isDemo: boolean;
  /** ISO 4217. */
  readonly currency: string;
  readonly userId: string;
  readonly userName: string;
  readonly roles: readonly Role[];
}

/** @throws Forbidden when none of the member's roles allows it. */
export function demand(ctx: Member, permission: Permission): void {
  if (!may(ctx.roles, permission)) throw new Forbidden('Your role in this house does not allow this.');
}
