import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { requireMember } from '@/lib/auth/current';
import { listConstituents } from '@/lib/constituents/queries';
import { NotFound } from '@/lib/errors';
import { getMaterial } from '@/lib/materials/queries';
import { may, type Role } from '@/lib/shared/permissions';
import { listSuppliers } from '@/lib/suppliers/queries';
import { QualityForm, type QualityScope } from '../../../_components/quality-form';

export const metadata: Metadata = { title: 'Quality' };

const NEW = 'new';

/** Writing a quality, whole or the part of it that the roles allow; "new" in place of an id makes one. */
export default async function QualityPage({ params }: { params: Promise<{ id: string; qualityId: string }> }) {
  const ctx = await requireMember('material.read');
  const { id, qualityId } = await params;
  const scope = scopeOf(ctx.roles);
  if (!scope || (qualityId === NEW && scope !== 'all')) notFound();
  const material = await getMaterial(ctx, id).catch((error) => {
    if (error instanceof NotFound) notFound();
    throw error;
  });
  const quality = material.qualities.find((each) => each.id === qualityId) ?? null;
  if (!quality && qualityId !== NEW) notFound();
  return (
    <QualityForm
      material={{ id, name: material.name }}
      quality={quality}
      scope={scope}
      suppliers={await listSuppliers(ctx)}
      constituents={await listConstituents(ctx)}
      currency={ctx.currency}
      today={new Date().toISOString().slice(0, 10)}
    />
  );
}

function scopeOf(roles: readonly Role[]): QualityScope | null {
  if (may(roles, 'material.write')) return 'all';
  if (may(roles, 'price.write')) return 'offers';
  return may(roles, 'constituent.write') ? 'composition' : null;
}
