import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { requireMember } from '@/lib/auth/current';
import { NotFound } from '@/lib/errors';
import { listFacets } from '@/lib/facets/queries';
import { getMaterial } from '@/lib/materials/queries';
import { MaterialForm } from '../../_components/material-form';

export const metadata: Metadata = { title: 'Edit material' };

export default async function EditMaterialPage({ params }: { params: Promise<{ id: string }> }) {
  const ctx = await requireMember('material.write');
  const { id } = await params;
  const material = await getMaterial(ctx, id).catch((error) => {
    if (error instanceof NotFound) notFound();
    throw error;
  });
  return <MaterialForm material={material} facets={await listFacets(ctx)} />;
}
