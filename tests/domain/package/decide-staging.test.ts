import { describe, expect, it } from 'vitest';
import type { PackageState } from '../../../src/domain/load/model';
import {
  decideRemoval,
  decideRunOpen,
  decideStaging,
  type StagingPackage,
  type StagingRun,
} from '../../../src/domain/package/decide-staging';

const today = '2026-03-03';
const morning: StagingRun = { id: 'run-morning', name: 'Mixed wraps', state: 'waiting' };
const evening: StagingRun = { id: 'run-evening', name: 'Orthopaedics', state: 'waiting' };

function aPackage(changes: Partial<StagingPackage> = {}): StagingPackage {
  return {
    id: 'package-1',
    code: 'P-20431784-52',
    state: 'packed',
    heldReason: null,
    expiresOn: null,
    run: null,
    openLoad: null,
    ...changes,
  };
}

function answer(changes: Partial<StagingPackage>, run = morning): string {
  const decision = decideStaging(aPackage(changes), run, today);
  return decision.ok ? decision.value : decision.refusal.code;
}

describe('staging a package', () => {
  it('takes what is packed', () => {
    expect(answer({})).toBe('stage');
  });

  it('changes nothing for what waits in this run already', () => {
    expect(answer({ state: 'staged', run: morning })).toBe('already-here');
  });

  it('leaves what waits in another run where it is, and says where', () => {
    const decision = decideStaging(aPackage({ state: 'staged', run: evening }), morning, today);
    expect(decision).toMatchObject({ ok: false, refusal: { code: 'package.in-another-run' } });
    expect(decision.ok ? '' : decision.refusal.sentence).toContain('Orthopaedics');
  });

  it('takes what came off a load whose run is over', () => {
    expect(answer({ state: 'staged', run: { ...evening, state: 'taken' } })).toBe('stage');
  });

  it('refuses what another load has listed, naming the load', () => {
    const decision = decideStaging(aPackage({ state: 'staged', openLoad: { number: '1-26062-04' } }), morning, today);
    expect(decision).toMatchObject({ ok: false, refusal: { code: 'package.in-another-load' } });
    expect(decision.ok ? '' : decision.refusal.sentence).toContain('1-26062-04');
  });

  it('refuses what is called back before it looks at anything else', () => {
    expect(answer({ state: 'recalled', heldReason: 'torn', expiresOn: '2026-01-01' })).toBe('package.called-back');
  });

  it('refuses what is held, with the reason', () => {
    const decision = decideStaging(aPackage({ heldReason: 'Filter cracked' }), morning, today);
    expect(decision).toMatchObject({ ok: false, refusal: { code: 'package.held' } });
    expect(decision.ok ? '' : decision.refusal.sentence).toContain('Filter cracked');
  });

  it('refuses what is in quarantine, also without a written reason', () => {
    expect(answer({ state: 'quarantined' })).toBe('package.held');
  });

  it('refuses what is past its last day, and takes it on that day', () => {
    expect(answer({ expiresOn: '2026-03-02' })).toBe('package.expired');
    expect(answer({ expiresOn: '2026-03-03' })).toBe('stage');
  });

  const over: PackageState[] = [
    'in-load',
    'processed',
    'sterile',
    'stored',
    'on-case-cart',
    'used',
    'returned',
    'discarded',
  ];
  it.each(over)('refuses what is %s', (state) => {
    expect(answer({ state })).toBe('package.not-ready');
  });
});

describe('a run', () => {
  it('takes packages while it waits', () => {
    expect(decideRunOpen(morning).ok).toBe(true);
  });

  it('takes none once a load has taken it or it was dropped', () => {
    expect(decideRunOpen({ ...morning, state: 'taken' })).toMatchObject({ refusal: { code: 'run.taken' } });
    expect(decideRunOpen({ ...morning, state: 'dropped' })).toMatchObject({ refusal: { code: 'run.dropped' } });
  });
});

describe('taking a package out of a run', () => {
  it('frees what waits in it', () => {
    expect(decideRemoval(aPackage({ state: 'staged', run: morning }), morning).ok).toBe(true);
  });

  it('refuses what waits elsewhere or nowhere', () => {
    const elsewhere = aPackage({ state: 'staged', run: evening });
    expect(decideRemoval(elsewhere, morning)).toMatchObject({ refusal: { code: 'package.not-in-run' } });
    expect(decideRemoval(aPackage(), morning)).toMatchObject({ refusal: { code: 'package.not-in-run' } });
  });

  it('refuses what a load has listed', () => {
    const listed = aPackage({ state: 'in-load', run: morning, openLoad: { number: '1-26062-04' } });
    expect(decideRemoval(listed, morning)).toMatchObject({ refusal: { code: 'package.in-another-load' } });
  });
});
