import { CourseOverTime } from '@/app/_components/charts/course-over-time';
import { courseOfMaterial } from '@/lib/shared/course';
import type { FacetView } from '@/lib/shared/facet';
import type { MaterialView } from '@/lib/shared/material-view';

export function Course({ material, facets }: { material: MaterialView; facets: readonly FacetView[] }) {
  return (
    <>
      <CourseOverTime facets={facets} course={courseOfMaterial(material)} name={material.name} />
      <p className="mt-3 text-note text-ink-soft">
        A thin layer on paper, from its evaporation alone{material.phases ? ' and its ratings by phase' : ''}.{' '}
        {material.evaporationSource ? `Evaporation: ${lowerFirst(material.evaporationSource)}.` : null}
      </p>
    </>
  );
}

const lowerFirst = (text: string) => `${text.charAt(0).toLowerCase()}${text.slice(1)}`.replace(/\.$/, '');
