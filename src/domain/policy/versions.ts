/** As much of a version as its place among the others rests on. Days are calendar days of the facility, YYYY-MM-DD. */
export type DatedVersion = {
  readonly number: number;
  /** From the beginning of this day on. */
  readonly effectiveOn: string;
};

/**
 * The version that holds on a day: the newest of those whose day has come. Numbers count, not days: who confirms a
 * later change for an earlier day means it to stand in place of what was planned.
 */
export function versionInForce<Version extends DatedVersion>(
  versions: readonly Version[],
  day: string,
): Version | undefined {
  return versions
    .filter((version) => version.effectiveOn <= day)
    .reduce<Version | undefined>((newest, one) => (newest && newest.number > one.number ? newest : one), undefined);
}

/** overtaken: a newer one with an earlier day came before this one's day, so that this one never held. */
export type VersionStanding = 'in-force' | 'planned' | 'past' | 'overtaken';

export function standingOf(
  version: DatedVersion & { readonly confirmedOn: string },
  versions: readonly (DatedVersion & { readonly confirmedOn: string })[],
  today: string,
): VersionStanding {
  if (versionInForce(versions, today)?.number === version.number) return 'in-force';
  const newer = versions.filter((one) => one.number > version.number);
  const isOvertaken = newer.some(
    (one) => one.effectiveOn <= version.effectiveOn && one.confirmedOn < version.effectiveOn,
  );
  if (isOvertaken) return 'overtaken';
  return version.effectiveOn > today ? 'planned' : 'past';
}
