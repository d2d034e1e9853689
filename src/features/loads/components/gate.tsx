import type { Block, CloseDecision } from '#domain/load/decide-close';
import { Icon } from '../../../components/icon';
import type { LetteredFinding } from '../../../components/cart-map/map-model';
import { Button } from '../../../components/ui/button';
import { TextWithCodes } from '../../../components/ui/code';
import { levelOf, Pin } from '../../../components/ui/pin';

/** More would leave no room for their words at 1280 px. */
const shownBlocks = 3;

type GateProps = {
  readonly decision: CloseDecision;
  readonly open: readonly LetteredFinding[];
  readonly isClosing: boolean;
  readonly mayClose: boolean;
  readonly onBlock: (block: Block) => void;
  readonly onClose: () => void;
};

function BlockMark({ block, letter }: { block: Block; letter: string | undefined }) {
  switch (block.kind) {
    case 'finding':
      return <Pin letter={letter ?? '!'} level={levelOf[block.finding.severity]} />;
    case 'unscanned':
      return <Count value={block.packages.length} />;
    case 'count-differs':
      return <Count value={Math.abs(block.counted - block.scanned)} />;
    case 'count-missing':
    case 'empty':
      return <Count value={null} />;
  }
}

function Count({ value }: { value: number | null }) {
  return (
    <span className="inline-grid h-6.5 min-w-6.5 flex-none place-items-center px-1 text-row leading-none font-bold tabular-nums shadow-[inset_0_0_0_1.5px_var(--color-ink-1)]">
      {value ?? '?'}
    </span>
  );
}

/** Names everything that holds the load open and nothing else. Paper while something does, film when nothing does. */
export function Gate({ decision, open, isClosing, mayClose, onBlock, onClose }: GateProps) {
  const letterOf = new Map(open.map(({ letter, finding }) => [finding.key, letter]));
  const { blocks } = decision;
  const shown = blocks.slice(0, shownBlocks);
  const rest = blocks.length - shown.length;
  const first = blocks[0];
  return (
    <section
      aria-label="What holds the load open"
      className={`gate-edge grid min-h-16.5 flex-none items-center gap-x-5.5 px-4 tablet:grid-cols-[auto_1fr_auto] ${decision.mayClose ? 'bg-film' : 'bg-fibre bg-paper-2'} max-tablet:gap-y-1 max-tablet:py-2`}
    >
      <p className="flex items-center gap-2.5 text-head" role="status">
        <Icon name={decision.mayClose ? 'tick' : 'lock'} size={24} />
        {decision.heading}
      </p>
      <ul className="flex min-w-0 items-center gap-x-5 overflow-hidden max-tablet:flex-wrap">
        {shown.map((block) => (
          <li key={block.kind === 'finding' ? block.finding.key : block.label} className="min-w-0">
            <button
              type="button"
              onClick={() => {
                onBlock(block);
              }}
              className="flex min-h-11 max-w-full items-center gap-2 text-left text-row"
            >
              <BlockMark
                block={block}
                letter={block.kind === 'finding' ? letterOf.get(block.finding.key) : undefined}
              />
              <span className="line-clamp-2 leading-[1.1rem]">
                <TextWithCodes>{block.label}</TextWithCodes>
              </span>
            </button>
          </li>
        ))}
        {rest > 0 && <li className="flex-none text-row text-ink-2">and {rest} more</li>}
      </ul>
      <Button
        kind="film"
        onPress={onClose}
        waitingWords={isClosing ? 'Closing' : undefined}
        blockedBecause={
          first
            ? `${decision.heading}. First: ${first.label}.`
            : mayClose
              ? undefined
              : 'Your role may look at loads, not close them.'
        }
        {...(first
          ? {
              onBlockedPress: () => {
                onBlock(first);
              },
            }
          : {})}
      >
        Close load
      </Button>
    </section>
  );
}
