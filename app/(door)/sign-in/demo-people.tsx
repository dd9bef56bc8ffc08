import type { DemoPerson } from '@/lib/people/queries';
import type { Role } from '@/lib/shared/permissions';
import { demoSignIn } from '../actions';

const SEES: Record<Role, string> = {
  owner: 'sees and does everything',
  perfumer: 'blends from the whole library',
  evaluator: 'reads materials, sees no price',
  buyer: 'suppliers, offers and prices',
  safety: 'constituents and limits, no prices',
  student: 'materials and the map',
};

/** One click each, while the demo house is loaded. */
export function DemoPeople({ people }: { people: readonly DemoPerson[] }) {
  return (
    <section aria-labelledby="demo" className="grid gap-3 border-t border-grout pt-6">
      <div>
        <h2 id="demo" className="text-lead">
          Or look around the sample house
        </h2>
        <p className="text-ink-soft">Its people, prices and ratings are invented.</p>
      </div>
      <ul className="grid gap-px border border-grout bg-grout sm:grid-cols-2">
        {people.map(({ name, role }) => (
          <li key={role} className="grid bg-paper">
            <form action={demoSignIn} className="grid">
              <input type="hidden" name="role" value={role} />
              <button
                type="submit"
                className="grid min-h-16 content-center px-4 py-2 text-left hover:bg-wash active:bg-pressed focus-visible:outline-offset-[-3px]"
              >
                <span>
                  <span className="font-[600]">{name}</span>, {role}
                </span>
                <span className="text-ink-soft">{SEES[role]}</span>
              </button>
            </form>
          </li>
        ))}
      </ul>
    </section>
  );
}
