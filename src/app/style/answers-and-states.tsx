import { Button } from '../../components/ui/button';
import { LevelWords, Pin } from '../../components/ui/pin';
import { ScanAnswer, ScanMark } from '../../components/ui/scan-answer';
import { Banner, EmptyState, WaitingState, WrongState } from '../../components/ui/states';
import { FilmPanel } from '../../components/ui/film-panel';
import { useSounds, type SoundName } from '../../lib/sounds';

export function Answers() {
  return (
    <section>
      <h2 className="mt-7 mb-2.5 text-head">What a scan answers</h2>
      <div className="grid gap-3.5 tablet:grid-cols-3">
        <ScanAnswer look="taken" word="Taken" title="Suction tip, 4 mm, bent">
          Put it in holder 2, slot 5, paper side left
        </ScanAnswer>
        <ScanAnswer look="look" word="Taken, no slot left" title="Retractor, double-ended">
          Bring a third holder, or leave it for the next load
        </ScanAnswer>
        <ScanAnswer look="called-back" word="Called back" title="Bone curette, size 1">
          Called back in recall 26-03. Put it on the hold shelf.
        </ScanAnswer>
        <ScanAnswer look="not-ready" word="Not taken" title="Ear speculum set">
          Its external CI is already turned. Check which side of the room it came from.
        </ScanAnswer>
        <ScanAnswer look="already-here" word="Already on this cart" title="Needle holder, 18 cm">
          Holder 2, slot 3. Moving it? Tap the new slot.
        </ScanAnswer>
        <ScanAnswer
          look="not-known"
          word="Not known"
          title={
            <>
              Code <span className="code">P-2O431</span>
            </>
          }
        >
          No item with this code. Scan again, or key it in.
        </ScanAnswer>
        <ScanAnswer look="place" word="Place set" title="Holder 2">
          Packages go here until another place is scanned.
        </ScanAnswer>
      </div>
      <FilmPanel className="mt-4 flex gap-4 px-4 pt-3.5 pb-3 max-tablet:flex-wrap" label="The scan line">
        <ScanMark look="taken" word="Taken" isLarge />
        <ScanMark look="look" word="Taken" isLarge />
        <ScanMark look="not-ready" word="Not taken" isLarge />
        <ScanMark look="held" word="Held" isLarge />
        <ScanMark look="called-back" word="Call back" isLarge />
        <ScanMark look="already-here" word="On it" isLarge />
        <ScanMark look="not-known" word="Not known" isLarge />
        <div className="min-w-0">
          <p className="text-small text-ink-2">Last scan, 09:41:08</p>
          <p className="truncate text-scan">Suction tip, 4 mm, bent</p>
          <p className="truncate text-[1.0625rem]/[1.4375rem]">
            <span className="code font-semibold">P-20431</span>
            <span className="ml-3 text-ink-2">pouch 90 × 230 mm</span>
          </p>
        </div>
      </FilmPanel>
      <Findings />
      <SoundBoard />
    </section>
  );
}

function Findings() {
  return (
    <ul className="mt-4 flex flex-wrap gap-x-8 gap-y-2">
      {(['hold', 'look', 'note'] as const).map((level, at) => (
        <li key={level} className="flex items-center gap-2.5">
          <Pin letter={['A', 'B', 'C'][at] ?? ''} level={level} isLevelSaid />
          <LevelWords level={level} />
        </li>
      ))}
    </ul>
  );
}

const soundNames: readonly SoundName[] = [
  'taken',
  'taken-but-look',
  'not-taken',
  'wrong-place',
  'holder-full',
  'released',
];

function SoundBoard() {
  const sounds = useSounds();
  return (
    <div className="mt-4 flex flex-wrap gap-2">
      {soundNames.map((name) => (
        <Button
          key={name}
          kind="quiet"
          size="small"
          icon="sound"
          onPress={() => {
            sounds.play(name);
          }}
        >
          {name.replaceAll('-', ' ')}
        </Button>
      ))}
    </div>
  );
}

export function States() {
  return (
    <section>
      <h2 className="mt-7 mb-2.5 text-head">Empty, waiting, cut off, wrong</h2>
      <div className="grid gap-5 tablet:grid-cols-2 desk:grid-cols-4">
        <EmptyState level={3} title="No cart open here" act={<Button size="small">Take over cart 3</Button>}>
          Scan a cart to begin its load, or take over cart 3 from Ines.
        </EmptyState>
        <WaitingState
          level={3}
          title="Fetching the load"
          waitsFor="The server has not answered yet. It is asked again."
        />
        <Banner title="No line to the server since 09:38" foot="Kept: 12 scans, 1 count. Last sent 09:37:52">
          Keep scanning. 12 scans are kept on this tablet and go up by themselves. Closing the load waits for the line.
        </Banner>
        <WrongState
          level={3}
          title="The cycle log did not arrive"
          onTryAgain={() => undefined}
          other={
            <Button kind="quiet" size="small">
              Key in
            </Button>
          }
        >
          Sterilizer 3 ended at 10:56 but sent no readings. Key them in from the printout, or try the line again.
        </WrongState>
      </div>
    </section>
  );
}
