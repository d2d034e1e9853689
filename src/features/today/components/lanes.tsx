import type { RunSummary } from '#contract/runs';
import type { Today, TodaySterilizer } from '#contract/today';
import { Link } from 'react-router-dom';
import { Icon } from '../../../components/icon';
import { useFacility } from '../../../lib/facility';
import { countOf, formatTime } from '../../../lib/format';
import { useMay } from '../../../lib/session';
import { useNow } from '../../../lib/use-now';
import { useSize } from '../../../lib/use-size';
import { hoursOf, loadBoxes, runFlags, spanOf, xOf, type LoadBox, type RunFlag, type TimeSpan } from '../lane-layout';
import { countOfDay, loadInWords, standingOf } from '../sterilizer-words';

const headWidth = 208;
/** Until the width of the screen is known: that of a tablet. */
const widthAtFirst = 948;
const rowHeight = 40;
const boxHeight = 34;

/** Every sterilizer on one time axis: its tests, its loads as boxes, what is wanted of it. */
export function Lanes({ today }: { today: Today }) {
  const now = useNow();
  const { timeZone } = useFacility();
  const [ref, size] = useSize();
  const width = size?.width ?? widthAtFirst;
  const span = spanOf(today, now);
  const nowX = xOf(now.getTime(), span, width);
  return (
    <section aria-label="Sterilizers today" className="relative">
      <div className="relative h-8" style={{ marginLeft: headWidth }} ref={ref} aria-hidden="true">
        {hoursOf(span).map((hour) => {
          const x = xOf(hour, span, width);
          // The clock of now covers an hour that is too near.
          return Math.abs(x - nowX) < 58 ? null : (
            <span key={hour} className="absolute top-1.5 -translate-x-1/2 text-small tabular-nums" style={{ left: x }}>
              {formatTime(new Date(hour), timeZone)}
            </span>
          );
        })}
      </div>
      <div className="pointer-events-none absolute inset-y-0 right-0" style={{ left: headWidth }} aria-hidden="true">
        {hoursOf(span).map((hour) => (
          <i key={hour} className="absolute top-8 bottom-0 w-px bg-paper-3" style={{ left: xOf(hour, span, width) }} />
        ))}
        <i className="absolute top-6 bottom-0 w-0.5 -translate-x-1/2 bg-ink-1" style={{ left: nowX }} />
        <span
          className="absolute top-0.5 -translate-x-1/2 bg-ink-1 px-2 py-1 text-row leading-5 font-bold text-paper-0 tabular-nums"
          style={{ left: nowX }}
        >
          {formatTime(now, timeZone)}
        </span>
      </div>
      <ul className="relative">
        {today.sterilizers.map((sterilizer) => (
          <Lane key={sterilizer.id} sterilizer={sterilizer} runs={today.runs} span={span} width={width} now={now} />
        ))}
      </ul>
    </section>
  );
}

type LaneProps = {
  readonly sterilizer: TodaySterilizer;
  readonly runs: readonly RunSummary[];
  readonly span: TimeSpan;
  readonly width: number;
  readonly now: Date;
};

function Lane({ sterilizer, runs, span, width, now }: LaneProps) {
  const { timeZone } = useFacility();
  const standing = standingOf(sterilizer, timeZone);
  const boxes = loadBoxes(sterilizer, span, width, now);
  const flags = runFlags(runs, sterilizer.id, span, width);
  const boxRows = boxes.reduce((most, box) => Math.max(most, box.row + 1), 0);
  const rows = Math.max(2, boxRows + (flags.length > 0 ? 1 : 0));
  return (
    <li className="relative flex border-b border-paper-3" style={{ minHeight: rows * rowHeight + 12 }}>
      <div className="flex-none py-2.5 pr-3" style={{ width: headWidth }}>
        <h2 className="truncate text-head">{sterilizer.name}</h2>
        <p className={`text-row ${standing.isOut ? 'font-label text-madder-3' : ''}`}>{standing.now}</p>
        <p
          className={`text-small ${standing.testState === 'failed' ? 'font-label text-madder-3' : standing.testState === 'missing' ? 'font-label text-straw-3' : 'text-ink-2'}`}
        >
          {standing.test}
        </p>
      </div>
      <div className="relative flex-1">
        <Tests sterilizer={sterilizer} span={span} width={width} timeZone={timeZone} />
        {standing.testState === 'missing' && !standing.isOut && <Untested x={xOf(now.getTime(), span, width)} />}
        {standing.isOut && <OutOfUse words={standing.now} />}
        {boxes.map((box) => (
          <Box key={box.load.id} box={box} />
        ))}
        {flags.map((flag) => (
          <Flag key={flag.run.id} flag={flag} row={rows - 1} timeZone={timeZone} />
        ))}
      </div>
    </li>
  );
}

function Tests({ sterilizer, span, width, timeZone }: Omit<LaneProps, 'runs' | 'now'> & { timeZone: string }) {
  return sterilizer.tests.map((test) => {
    const x = xOf(Date.parse(test.testedAt), span, width);
    if (x < 0) return null;
    const words = `Air removal ${test.result} at ${formatTime(test.testedAt, timeZone)}, read by ${test.readBy}`;
    return (
      <span
        key={test.id}
        title={words}
        className={`absolute grid w-7 -translate-x-1/2 place-items-center text-paper-0 ${test.result === 'passed' ? 'weld' : 'torn bg-madder-3'}`}
        style={{ left: x, top: 9, height: boxHeight }}
      >
        <Icon name={test.result === 'passed' ? 'tick' : 'cross'} size={17} />
        <span className="sr-only">{words}</span>
      </span>
    );
  });
}

/** A stretch that is bare yet: no load closes here before the test has passed. */
function Untested({ x }: { x: number }) {
  return (
    <span
      aria-hidden="true"
      className="absolute flex items-center gap-2 border border-dashed border-paper-edge bg-paper-1 px-2.5 text-small font-medium whitespace-nowrap"
      style={{ left: Math.max(8, x - 208), top: 9, height: boxHeight }}
    >
      <Icon name="wait" size={16} />
      air removal test first
    </span>
  );
}

function OutOfUse({ words }: { words: string }) {
  return (
    <div aria-hidden="true" className="absolute inset-x-4 top-[22px] flex items-center gap-4 text-madder-3">
      <i className="h-px flex-1 bg-[repeating-linear-gradient(90deg,currentColor_0_10px,transparent_10px_14px,currentColor_14px_17px,transparent_17px_21px)]" />
      <span className="text-row font-label">{words}</span>
      <i className="h-px flex-[3] bg-[repeating-linear-gradient(90deg,currentColor_0_10px,transparent_10px_14px,currentColor_14px_17px,transparent_17px_21px)]" />
    </div>
  );
}

function boxLook(box: LoadBox): string {
  switch (box.load.state) {
    case 'building':
      return 'border-[1.5px] border-dashed border-paper-edge bg-paper-1 justify-start';
    case 'released':
    case 'released-implant-early':
      return 'weld justify-between';
    case 'failed':
    case 'held':
      return 'bg-madder-3 text-paper-0 justify-between';
    default:
      return 'border-[1.5px] border-ink-1 bg-paper-0 justify-between';
  }
}

function Box({ box }: { box: LoadBox }) {
  const { load } = box;
  const isBuilding = load.state === 'building';
  return (
    <Link
      to={`/loads/${load.id}`}
      title={`Load ${load.number}, ${loadInWords(load)}`}
      className={`absolute flex items-center gap-2 overflow-hidden px-2 text-row whitespace-nowrap text-inherit no-underline hover:shadow-[0_0_0_2px_var(--color-film-4)] ${boxLook(box)}`}
      style={{ left: box.left, width: box.width, top: 9 + box.row * rowHeight, height: boxHeight }}
    >
      <span className="sr-only">Load {load.number}, </span>
      <b className="font-bold tabular-nums" aria-hidden="true">
        {countOfDay(load)}
      </b>
      {isBuilding ? (
        <span className="truncate text-small">
          {load.scanned} of {load.listed}
          <span className="text-ink-2">, {load.cartName.toLowerCase()}</span>
        </span>
      ) : (
        <Icon name={load.state === 'closed' ? 'lock' : 'tick'} size={15} />
      )}
      <span className="sr-only">, {loadInWords(load)}</span>
      {load.implants > 0 && <Icon name="implant" size={15} />}
    </Link>
  );
}

function Flag({ flag, row, timeZone }: { flag: RunFlag; row: number; timeZone: string }) {
  const mayPack = useMay('package.pack');
  const { run, x, isLeft } = flag;
  const wanted = formatTime(run.wantedAt ?? '', timeZone);
  const look = `absolute flex items-center gap-2 text-small whitespace-nowrap text-ink-1 no-underline ${isLeft ? '-translate-x-full flex-row-reverse' : ''}`;
  const place = { left: x, top: 9 + row * rowHeight, height: boxHeight };
  const inside = (
    <>
      <i className="h-full w-0 border-l-2 border-dashed border-film-4" aria-hidden="true" />
      <span className="max-w-44 truncate">
        <b className="font-semibold">{run.packages}</b> {run.name}
        <span className="sr-only">, wanted for {wanted}</span>
      </span>
    </>
  );
  const words = `${run.name}, ${countOf(run.packages, 'package')}, wanted for ${wanted}`;
  return mayPack ? (
    <Link to={`/pack/runs/${run.id}`} title={words} className={`${look} hover:underline`} style={place}>
      {inside}
    </Link>
  ) : (
    <span title={words} className={look} style={place}>
      {inside}
    </span>
  );
}
