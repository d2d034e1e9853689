import { afterEach, beforeAll, describe, expect, it } from 'vitest';
import { evaluateLoad } from '../../../src/domain/load/evaluate-load';
import { openTestApp } from '../../support/test-app';
import { changePolicy, today } from '../policies/policy-room';
import { closeLoad, readyLoad } from './closed-loads';
import { detailOf, edit, giveUp, openLoad, openLoadingBay, type LoadingBay } from './loading-bay';

const app = openTestApp();
let bay: LoadingBay;

beforeAll(async () => {
  bay = await openLoadingBay(app);
});

afterEach(() => {
  app.clock.set('2026-03-03T13:30:00.000Z');
});

async function policyNumberOf(loadId: string): Promise<number> {
  return (await detailOf(await app.as('technician'), loadId)).policyNumber;
}

async function facingFindings(loadId: string): Promise<number> {
  const { view, policy } = await detailOf(await app.as('technician'), loadId);
  return evaluateLoad(view, policy).filter((finding) => finding.ruleId === 'facing').length;
}

describe('the policy of a load', () => {
  it('is the version in force when it is opened, and stays so to its close', async () => {
    const before = await readyLoad(app, bay);
    const number = await policyNumberOf(before);
    const next = await changePolicy(app, { changes: { packageClearanceMm: 40 } });
    expect(next).toBe(number + 1);

    const after = await openLoad(await app.as('lead'), bay, { cart: 1 });
    expect(await policyNumberOf(after)).toBe(next);
    expect((await detailOf(await app.as('lead'), after)).policy.packageClearanceMm).toBe(40);
    expect(await policyNumberOf(before)).toBe(number);
    expect((await detailOf(await app.as('lead'), before)).policy.packageClearanceMm).toBe(25);

    await closeLoad(app, bay, before);
    const row = await app.db('loads').where({ id: before }).first<{ verdict: { policyNumber: number } }>('verdict');
    expect(row.verdict.policyNumber).toBe(number);
    await giveUp(app, after);
  });

  it('is the next one only from its day on, as the facility’s calendar has it', async () => {
    const next = await changePolicy(app, { changes: { headroomMm: 9 }, effectiveOn: '2026-03-04' });
    const numberWhenOpenedAt = async (at: string) => {
      app.clock.set(at);
      const loadId = await openLoad(await app.as('technician'), bay);
      const number = await policyNumberOf(loadId);
      await giveUp(app, loadId);
      return number;
    };
    // Midnight in Chicago is 06:00 UTC.
    expect(await numberWhenOpenedAt('2026-03-04T05:59:59.000Z')).toBe(next - 1);
    expect(await numberWhenOpenedAt('2026-03-04T06:00:00.000Z')).toBe(next);
  });

  it('never becomes another, whoever writes to the database', async () => {
    const loadId = await openLoad(await app.as('technician'), bay);
    const other = await app.db('policies').where({ facility_id: app.facilities.A, number: 1 }).first<{ id: string }>();
    await expect(app.db('loads').where({ id: loadId }).update({ policy_id: other.id })).rejects.toThrow(
      'keeps the policy',
    );
    await giveUp(app, loadId);
  });
});

describe('the facing rule of one sterilizer', () => {
  it('holds for its loads in place of the facility’s: the same cart has a pin under the one and none under the other', async () => {
    const load = async () => {
      const loadId = await readyLoad(app, bay);
      const technician = await app.as('technician');
      const { view } = await detailOf(technician, loadId);
      const papers = ['left', 'right'] as const;
      const inOrder = view.packages.toSorted((one, other) => slotOf(one.placement) - slotOf(other.placement));
      await edit(
        technician,
        loadId,
        inOrder.map((one, index) => ({
          edit: 'turn-paper',
          packageId: one.packageId,
          paper: papers[index % 2] ?? 'left',
        })),
      );
      return loadId;
    };
    const oneWay = await load();
    expect(await facingFindings(oneWay)).toBeGreaterThan(0);
    await giveUp(app, oneWay);

    await changePolicy(app, { changes: {}, facingBySterilizer: { [bay.sterilizerId]: 'alternating' } });
    const alternating = await load();
    expect((await detailOf(await app.as('technician'), alternating)).policy.facing).toBe('alternating');
    expect(await facingFindings(alternating)).toBe(0);
    await giveUp(app, alternating);

    await changePolicy(app, { changes: {}, facingBySterilizer: {}, effectiveOn: today });
    const again = await load();
    expect(await facingFindings(again)).toBeGreaterThan(0);
    await giveUp(app, again);
  });
});

function slotOf(placement: { readonly at: string; readonly slot?: number } | null): number {
  return placement?.slot ?? 0;
}
