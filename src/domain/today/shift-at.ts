/** A shift by the clock on the wall, HH:MM; one that ends before it begins runs past midnight. */
export type Shift = { readonly name: string; readonly startsAt: string; readonly endsAt: string };

function isOn({ startsAt, endsAt }: Shift, time: string): boolean {
  return startsAt <= endsAt ? startsAt <= time && time < endsAt : startsAt <= time || time < endsAt;
}

/** The shift that is on at the wall-clock time HH:MM; where two overlap for handing over, the one that began last. */
export function shiftAt(shifts: readonly Shift[], time: string): Shift | null {
  let latest: Shift | null = null;
  for (const shift of shifts) {
    if (!isOn(shift, time)) continue;
    if (latest === null || beganLater(shift, latest, time)) latest = shift;
  }
  return latest;
}

/** A start later than now was yesterday's. */
function beganLater(one: Shift, other: Shift, time: string): boolean {
  const [isToday, isOtherToday] = [one.startsAt <= time, other.startsAt <= time];
  return isToday === isOtherToday ? one.startsAt > other.startsAt : isToday;
}
