import { currentMember } from '@/lib/auth/current';
import { Wordmark } from './_components/brand/wordmark';
import { ButtonLink } from './_components/ui/button';
import { LiveBlend } from './_sample/live-blend';
import { PRICES } from './_sample/prices';
import { type SampleAnswer, sampleAnswer } from './_sample/sample-answer';

/** The same for everyone, so it is solved once for all of them. */
let first: SampleAnswer | undefined;

/** What Stillroom does, said in one breath, and done before the visitor's eyes. */
export default async function Home() {
  const member = await currentMember();
  first ??= sampleAnswer(PRICES.first);
  return (
    <>
      <header className="flex flex-wrap items-center justify-between gap-3 border-b border-ink bg-paper px-4 py-4 md:px-10">
        <Wordmark height={24} />
        <nav aria-label="The door" className="flex gap-2">
          {member ? (
            <ButtonLink href="/materials" look="solid" prefetch={false}>
              To {member.teamName}
            </ButtonLink>
          ) : (
            <>
              <ButtonLink href="/sign-in" prefetch={false}>
                Sign in
              </ButtonLink>
              <ButtonLink href="/sign-up" look="solid" prefetch={false}>
                Open a house
              </ButtonLink>
            </>
          )}
        </nav>
      </header>
      <main>
        <LiveBlend first={first} intro={<Intro />} />
        <Closing />
      </main>
    </>
  );
}

function Intro() {
  return (
    <div>
      <h1 className="max-w-[11ch] text-display">The closest blend a price can buy</h1>
      <p className="mt-6 max-w-[44ch] text-lead">
        Say what it should smell like, what it may cost and what it must not contain. Stillroom finds the blend of
        materials you can buy that comes closest, and shows that none comes closer.
      </p>
    </div>
  );
}

const KEPT = [
  {
    title: 'Know your materials',
    words:
      'What each smells like, how long, how strongly, what it contains and what it costs, per kilogram and at equal strength: a cheap weak material can cost more than a dear strong one.',
  },
  {
    title: 'See what is alike',
    words:
      'A map of everything on the shelf, linked by shared facets or shared constituents, so that a stand-in is found by smell and not by name.',
  },
  {
    title: 'Answer within the rules',
    words:
      'Limits on constituents in the worst case, natural share, strength, what must be in and what must not; each rule says what it costs in closeness.',
  },
] as const;

function Closing() {
  return (
    <>
      <section aria-label="What a house keeps here" className="tiles border-t-0 md:grid-cols-3">
        {KEPT.map(({ title, words }) => (
          <div key={title} className="px-5 py-8 md:px-10">
            <h2 className="text-title">{title}</h2>
            <p className="mt-2 max-w-[46ch] text-ink-soft">{words}</p>
          </div>
        ))}
      </section>
      <footer className="grid gap-2 bg-paper px-4 py-8 text-ink-soft md:px-10">
        <p>
          Prices, strengths and ratings of the sample are invented. “Closest” means closest in this model: noses decide.
        </p>
        <p>For independent perfumers and small fragrance houses.</p>
      </footer>
    </>
  );
}
