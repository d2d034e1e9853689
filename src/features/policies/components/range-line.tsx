import type { QuantityParameter } from '#domain/load/policy';
import { useFacility } from '../../../lib/facility';
import { endsWords } from '../setting-words';

type RangeLineProps = {
  readonly parameter: QuantityParameter;
  readonly inForce: number;
  readonly proposed: number | null;
};

/** Per cent of the way from the least to the greatest. */
function wayAlong({ range }: QuantityParameter, value: number): string {
  const width = range.greatest - range.least;
  return width === 0 ? '0%' : `${((value - range.least) / width) * 100}%`;
}

const mark = 'absolute top-1/2 -translate-x-1/2 -translate-y-1/2';

function DefaultMark({ className = '', left }: { className?: string; left?: string }) {
  return (
    <span
      className={`${className} h-3.5 w-3.5 rounded-full bg-paper-1 shadow-[inset_0_0_0_1.75px_var(--color-ink-2)]`}
      style={{ left }}
    />
  );
}

function InForceMark({ className = '', left }: { className?: string; left?: string }) {
  return <span className={`${className} h-2 w-2 bg-film-5`} style={{ left }} />;
}

function ProposedMark({ className = '', left }: { className?: string; left?: string }) {
  return (
    <span
      className={`${className} h-3 w-3 rotate-45 bg-film-1 shadow-[inset_0_0_0_1.75px_var(--color-film-4)]`}
      style={{ left }}
    />
  );
}

/** Where a figure stands between the least and the greatest it may be. The words beside it say the same. */
export function RangeLine({ parameter, inForce, proposed }: RangeLineProps) {
  const { unitSystem } = useFacility();
  const [least, greatest] = endsWords(parameter, unitSystem);
  return (
    <div aria-hidden="true" className="max-w-64">
      <div className="relative mx-1.75 h-6">
        <span className="absolute inset-x-0 top-1/2 h-px bg-paper-edge" />
        <span className="absolute top-1/2 left-0 h-2 w-px -translate-y-1/2 bg-paper-edge" />
        <span className="absolute top-1/2 right-0 h-2 w-px -translate-y-1/2 bg-paper-edge" />
        <DefaultMark className={mark} left={wayAlong(parameter, parameter.default)} />
        {proposed !== null && <ProposedMark className={mark} left={wayAlong(parameter, proposed)} />}
        <InForceMark className={mark} left={wayAlong(parameter, inForce)} />
      </div>
      <p className="flex justify-between text-least text-ink-2 tabular-nums">
        <span>{least}</span>
        <span>{greatest}</span>
      </p>
    </div>
  );
}

/** What the marks on the lines stand for. */
export function RangeLegend({ hasProposal }: { hasProposal: boolean }) {
  return (
    <span aria-hidden="true" className="flex flex-wrap items-center gap-x-4 text-least text-ink-2">
      <span className="flex items-center gap-1.5">
        <InForceMark className="inline-block" /> in force
      </span>
      <span className="flex items-center gap-1.5">
        <DefaultMark className="inline-block" /> default
      </span>
      {hasProposal && (
        <span className="flex items-center gap-2">
          <ProposedMark className="inline-block" /> proposed
        </span>
      )}
    </span>
  );
}
