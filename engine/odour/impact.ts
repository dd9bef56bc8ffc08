/**
 * What each line adds to the smell, as shares that sum to 1: (s_i m_i)^n over the sum of all, from strengths s_i,
 * amounts m_i and the exponent n. All 0 where nothing smells.
 *
 * Scaled by the strongest line first, so that neither a trace nor a mighty material leaves the range of a double.
 */
export function impactShares(strengths: ArrayLike<number>, amounts: ArrayLike<number>, exponent: number): Float64Array {
  const loudness = Float64Array.from(strengths, (strength, line) => strength * amounts[line]!);
  const strongest = loudness.reduce((most, value) => Math.max(most, value), 0);
  if (!(strongest > 0)) return loudness.fill(0);
  const impacts = loudness.map((value) => (value / strongest) ** exponent);
  const sum = impacts.reduce((total, value) => total + value, 0);
  return impacts.map((value) => value / sum);
}

/** p = sum_i y_i a_i */
export function mixedProfile(profiles: readonly ArrayLike<number>[], impacts: ArrayLike<number>): Float64Array {
  const profile = new Float64Array(profiles[0]!.length);
  for (const [line, vector] of profiles.entries()) {
    for (let facet = 0; facet < profile.length; facet++) profile[facet]! += impacts[line]! * vector[facet]!;
  }
  return profile;
}
