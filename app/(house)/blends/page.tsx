import type { Metadata } from 'next';
import Link from 'next/link';
import { Strip } from '@/app/_components/strip/strip';
import { ButtonLink } from '@/app/_components/ui/button';
import { ScreenHead } from '@/app/_components/ui/screen';
import { EmptyState } from '@/app/_components/ui/states';
import { Pager, Table, Td, Th } from '@/app/_components/ui/table';
import { requireMember } from '@/lib/auth/current';
import { listBlends } from '@/lib/blends/queries';
import { listFacets } from '@/lib/facets/queries';
import { pointsOf, pricePerKg } from '@/lib/shared/blend-figures';
import { type SavedBlendItem, savedBlendQuery } from '@/lib/shared/blend-view';
import type { FacetView } from '@/lib/shared/facet';
import { may } from '@/lib/shared/permissions';
import { dayInWords } from './_components/day';

export const metadata: Metadata = { title: 'Saved blends' };

interface Search {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function SavedBlendsPage({ searchParams }: Search) {
  const member = await requireMember('blend.read');
  const { after } = savedBlendQuery.catch({}).parse({ after: (await searchParams).after });
  const [{ items, next }, facets] = await Promise.all([listBlends(member, after), listFacets(member)]);
  const maySolve = may(member.roles, 'blend.solve');
  const seesPrices = may(member.roles, 'price.read');
  return (
    <>
      <ScreenHead
        title="Saved blends"
        about="Each as it was solved on its day, with that day’s names, prices and limits."
        actions={maySolve ? <ButtonLink href="/blend">New blend</ButtonLink> : null}
      />
      {items.length === 0 ? (
        <EmptyState
          title={after ? 'No more blends' : 'No blend is saved yet'}
          action={
            maySolve ? (
              <ButtonLink look="solid" href="/blend">
                Blend something
              </ButtonLink>
            ) : null
          }
        >
          Solve one that is worth smelling and save it; it will be here.
        </EmptyState>
      ) : (
        <Table label="Saved blends, newest first">
          <thead>
            <tr>
              <Th>Blend</Th>
              <Th>Of</Th>
              <Th numeric>Distance, points</Th>
              {seesPrices ? <Th numeric>Price then</Th> : null}
              <Th>Saved</Th>
            </tr>
          </thead>
          <tbody>
            {items.map((item) => (
              <Row key={item.id} item={item} facets={facets} seesPrices={seesPrices} />
            ))}
          </tbody>
        </Table>
      )}
      {items.length > 0 ? (
        <Pager
          words={`${items.length} ${items.length === 1 ? 'blend' : 'blends'}, newest first`}
          previous={after ? '/blends' : null}
          next={next ? `/blends?after=${next}` : null}
        />
      ) : null}
    </>
  );
}

interface RowProps {
  item: SavedBlendItem;
  facets: readonly FacetView[];
  seesPrices: boolean;
}

function Row({ item, facets, seesPrices }: RowProps) {
  const { id, name, targetName, materials, distance, costPerKg, currency, profile, createdAt, createdBy } = item;
  return (
    <tr className="hover:bg-wash">
      <Td>
        <span className="flex items-center gap-3">
          <Strip size="table" facets={facets} profile={profile} decorative />
          <span className="min-w-0">
            <Link href={`/blends/${id}`} className="block font-[560] hover:underline">
              {name}
            </Link>
            <span className="block max-w-[46ch] truncate text-note text-ink-soft">{materials.join(', ')}</span>
          </span>
        </span>
      </Td>
      <Td>{targetName}</Td>
      <Td numeric>{pointsOf(distance)}</Td>
      {seesPrices ? <Td numeric>{costPerKg ? pricePerKg(Number(costPerKg), currency) : ''}</Td> : null}
      <Td className="whitespace-nowrap">
        {dayInWords(createdAt)}
        <span className="block text-note text-ink-soft">{createdBy}</span>
      </Td>
    </tr>
  );
}
