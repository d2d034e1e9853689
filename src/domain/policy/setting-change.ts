import { policyParameters, type FacingRule, type LoadPolicy } from '../load/policy';
import type { PolicySettings, SettingValue } from './settings';

/** One thing that differs between two versions. Kept with the version, so it names what it is about by id. */
export type SettingChange =
  | { readonly of: 'parameter'; readonly id: string; readonly before: SettingValue; readonly after: SettingValue }
  /** null: as the facility's rule says. */
  | {
      readonly of: 'facing-at-sterilizer';
      readonly sterilizerId: string;
      readonly before: FacingRule | null;
      readonly after: FacingRule | null;
    };

/** What a person states of a new version; what is not named stays as it is. */
export type StatedSettings = {
  readonly changes: Partial<LoadPolicy>;
  /** All overrides there are to be; undefined leaves them. */
  readonly facingBySterilizer: Readonly<Record<string, FacingRule>> | undefined;
};

export function withStated(settings: PolicySettings, stated: StatedSettings): PolicySettings {
  return {
    policy: { ...settings.policy, ...stated.changes },
    facingBySterilizer: stated.facingBySterilizer ?? settings.facingBySterilizer,
  };
}

/** What differs, in the order in which the settings are shown; sterilizers by id. */
export function changesBetween(before: PolicySettings, after: PolicySettings): readonly SettingChange[] {
  const ofParameters = policyParameters.flatMap(({ id }): SettingChange[] =>
    before.policy[id] === after.policy[id]
      ? []
      : [{ of: 'parameter', id, before: before.policy[id], after: after.policy[id] }],
  );
  const sterilizerIds = new Set([...Object.keys(before.facingBySterilizer), ...Object.keys(after.facingBySterilizer)]);
  const ofSterilizers = [...sterilizerIds].sort().flatMap((sterilizerId): SettingChange[] => {
    const was = before.facingBySterilizer[sterilizerId] ?? null;
    const is = after.facingBySterilizer[sterilizerId] ?? null;
    return was === is ? [] : [{ of: 'facing-at-sterilizer', sterilizerId, before: was, after: is }];
  });
  return [...ofParameters, ...ofSterilizers];
}

/** The settings with each change made. A change of something this program does not know is passed over. */
export function withChanges(settings: PolicySettings, changes: readonly SettingChange[]): PolicySettings {
  const known = new Set<string>(policyParameters.map(({ id }) => id));
  const values = changes.flatMap((change) =>
    change.of === 'parameter' && known.has(change.id) ? [[change.id, change.after] as const] : [],
  );
  const facing = new Map(Object.entries(settings.facingBySterilizer));
  for (const change of changes) {
    if (change.of !== 'facing-at-sterilizer') continue;
    if (change.after === null) facing.delete(change.sterilizerId);
    else facing.set(change.sterilizerId, change.after);
  }
  return {
    policy: { ...settings.policy, ...Object.fromEntries(values) },
    facingBySterilizer: Object.fromEntries(facing),
  };
}
