import { evaporate } from '@/engine/odour/evaporate';
import type { MaterialView } from './material-view';
import { PHASES } from './material-words';

/** When a phase is at its fullest, in hours: a convention of ours, between which the profile passes over evenly in log time. */
const PHASE_HOURS = { opening: 0.1, heart: 2, dry: 24 } as const;
const HOURS = [0.05, 0.1, 0.25, 0.5, 1, 2, 4, 8, 16, 24, 48, 72, 168, 336, 672];
/** So much paper per gram of material that it evaporates as a trace does, at its own rate. */
const PAPER = 1e6;
/** Less than this is nothing to smell, and the drawing ends. */
const FAINT = 0.02;

type Smelling = Pick<MaterialView, 'id' | 'profile' | 'phases' | 'strength' | 'evaporationPerHour'>;

/** What a thin layer of it on paper smells of as hours pass, weakening as it goes. At least three times. */
export function courseOfMaterial(material: Smelling): { hours: number; profile: number[] }[] {
  const line = {
    material: {
      id: material.id,
      profile: material.profile,
      strength: material.strength || 1,
      costPerKg: 0,
      evaporation: material.evaporationPerHour ?? 0,
    },
    share: 1,
  };
  const course = evaporate([line], HOURS, { carrier: PAPER });
  const end = course.findIndex(({ intensity }) => intensity < FAINT);
  return course.slice(0, Math.max(3, end < 0 ? course.length : end + 1)).map(({ hours, intensity }) => ({
    hours,
    profile: profileAt(material, hours).map((value) => value * intensity),
  }));
}

function profileAt({ profile, phases }: Smelling, hours: number): number[] {
  if (!phases) return [...profile];
  const stages = PHASES.map((phase) => ({ at: Math.log(PHASE_HOURS[phase]), profile: phases[phase] ?? profile }));
  const now = Math.log(hours);
  const next = stages.findIndex(({ at }) => at > now);
  const [before, after] = [stages[next < 0 ? stages.length - 1 : Math.max(0, next - 1)], stages[next]];
  if (!before || !after || before === after) return [...(before?.profile ?? profile)];
  const share = (now - before.at) / (after.at - before.at);
  return before.profile.map((value, place) => value + share * ((after.profile[place] ?? 0) - value));
}
