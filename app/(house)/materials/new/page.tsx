import type { Metadata } from 'next';
import { requireMember } from '@/lib/auth/current';
import { listFacets } from '@/lib/facets/queries';
import { MaterialForm } from '../_components/material-form';

export const metadata: Metadata = { title: 'New material' };

export default async function NewMaterialPage() {
  const ctx = await requireMember('material.write');
  return <MaterialForm material={null} facets={await listFacets(ctx)} />;
}
