import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { CourseOverTime } from '@/app/_components/charts/course-over-time';
import { Polar } from '@/app/_components/charts/polar';
import { ProfileBars } from '@/app/_components/charts/profile-bars';
import { Strip } from '@/app/_components/strip/strip';

const facets = ['Rosy', 'Honeyed', 'Green'].map((name, index) => ({
  id: name,
  name,
  family: name,
  hueDeg: index * 100,
  lightness: 0.7,
}));

describe('drawings say in words what they show', () => {
  it('the strip', () => {
    const html = renderToStaticMarkup(
      <Strip size="table" facets={facets} profile={[9, 5, 3]} lastsHours={24} name="Rose absolute" />,
    );
    expect(html).toContain('aria-label="Rose absolute: mostly rosy, honeyed and green; lasts a day"');
    expect(html).not.toContain('<text');
  });

  it('the strip beside its own words is silent', () => {
    const html = renderToStaticMarkup(<Strip size="node" facets={facets} profile={[9, 5, 3]} decorative />);
    expect(html).toContain('aria-hidden="true"');
    expect(html).not.toContain('aria-label');
  });

  it('the large strip names each band with its share', () => {
    const html = renderToStaticMarkup(<Strip size="page" facets={facets} profile={[6, 3, 1]} />);
    expect(html).toMatch(/>Rosy<\/text>.*>60.%<\/text>.*>Honeyed<\/text>.*>30.%<\/text>/s);
  });

  it('the bars end with the difference, and both values can be heard', () => {
    const html = renderToStaticMarkup(
      <ProfileBars facets={facets} target={[9, 5, 0]} blend={[7.6, 5.4, 0]} targetName="Rose" />,
    );
    expect(html).toContain('Rose 9.0, Blend 7.6');
    expect(html).toContain('−1.4');
    expect(html).toContain('+0.4');
    expect(html).not.toContain('Green');
  });

  it('the flower and the course have a table each', () => {
    const flower = renderToStaticMarkup(<Polar facets={facets} profile={[6, 3, 1]} name="Rose" spread={[0.5, 0, 0]} />);
    expect(flower).toContain('± 0.5');
    const course = renderToStaticMarkup(
      <CourseOverTime
        facets={facets}
        name="Rose"
        course={[0.25, 4, 24].map((hours, i) => ({ hours, profile: [6 - 3 * i, 3, 1] }))}
      />,
    );
    expect(course).toContain('Rose over time: mostly rosy first, honeyed at the end');
    for (const words of ['15 min', '4 h', '1 day']) expect(course).toContain(words);
  });
});
