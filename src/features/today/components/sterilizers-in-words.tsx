import type { TodaySterilizer } from '#contract/today';
import { Link } from 'react-router-dom';
import { TinyProofStripe, type StretchState } from '../../../components/proof-stripe';
import { PanelHead } from '../../../components/ui/heading';
import { useFacility } from '../../../lib/facility';
import { standingOf, type Standing } from '../sterilizer-words';

const testStretch: Readonly<Record<Standing['testState'], StretchState>> = {
  passed: 'proven',
  failed: 'failed',
  missing: 'not-yet',
  'not-asked': 'not-asked',
};

/** The day's first stretch and one for each of its loads. */
function stretchesOf(sterilizer: TodaySterilizer, standing: Standing): StretchState[] {
  return [
    testStretch[standing.testState],
    ...sterilizer.loads.map((load): StretchState => {
      if (load.state === 'released') return 'proven';
      if (load.state === 'released-implant-early') return 'by-exception';
      if (load.state === 'failed' || load.state === 'held') return 'failed';
      return load.state === 'building' ? 'not-yet' : 'waiting';
    }),
  ];
}

/** The sterilizers on the phone, where no time axis has room. */
export function SterilizersInWords({ sterilizers }: { sterilizers: readonly TodaySterilizer[] }) {
  const { timeZone } = useFacility();
  return (
    <section aria-label="Sterilizers">
      <PanelHead title="Sterilizers" />
      <ul>
        {sterilizers.map((sterilizer) => {
          const standing = standingOf(sterilizer, timeZone);
          const building = sterilizer.loads.find((load) => load.state === 'building');
          const stretches = stretchesOf(sterilizer, standing);
          return (
            <li
              key={sterilizer.id}
              className="grid grid-cols-[1fr_auto] items-center gap-3 border-t border-paper-3 py-2.5 first:border-t-0"
            >
              <span>
                <span className="block text-[1.0625rem]/[1.375rem]">
                  <b className="mr-2 font-label">{sterilizer.number}</b>
                  <span className={standing.isOut ? 'font-label text-madder-3' : ''}>{standing.now}</span>
                </span>
                <span className="block text-small text-ink-2">{standing.test}</span>
                {building && (
                  <Link to={`/loads/${building.id}`} className="inline-flex min-h-11 items-center text-row">
                    Load {building.number}, {building.scanned} of {building.listed} scanned
                  </Link>
                )}
              </span>
              <TinyProofStripe states={stretches} width={Math.min(124, 24 * stretches.length)} />
            </li>
          );
        })}
      </ul>
    </section>
  );
}
