import { serviceStateWords } from '#domain/catalogue/service-state-words';
import type { SterilizerOnFile } from '#contract/equipment';
import type { ServiceState } from '#domain/load/model';
import { Fact, Facts } from '../../../components/stock/facts';
import { Code } from '../../../components/ui/code';
import { LinkButton } from '../../../components/ui/link-button';
import { Time } from '../../../components/ui/time';
import { useFacility } from '../../../lib/facility';
import { formatMass, formatSize } from '../../../lib/format';
import { useMay } from '../../../lib/session';
import { sizeClassWords } from '../equipment-words';
import { ChamberDrawing } from './chamber-drawing';
import { ChangeButton } from './change-button';

export function ServiceStateWords({ state }: { state: ServiceState }) {
  return (
    <span className={state === 'in-service' ? '' : 'font-semibold text-madder-3'}>{serviceStateWords[state]}</span>
  );
}

/** Today's test in words: passed when, failed when, or not yet. */
export function AirRemovalWords({ sterilizer }: { sterilizer: SterilizerOnFile }) {
  const { airRemoval, needsAirRemovalTest } = sterilizer;
  if (airRemoval !== null) {
    return (
      <span className={airRemoval.result === 'failed' ? 'font-semibold text-madder-3' : ''}>
        {airRemoval.result === 'passed' ? 'Passed' : 'Failed'} <Time at={airRemoval.testedAt} />
      </span>
    );
  }
  return needsAirRemovalTest ? (
    <span className="font-semibold text-straw-3">Not yet</span>
  ) : (
    <span className="text-ink-2">Not asked</span>
  );
}

/** One sterilizer: its chamber to scale, whether it may be used, what it is qualified for. */
export function SterilizerPanel({ sterilizer, onChange }: { sterilizer: SterilizerOnFile; onChange: () => void }) {
  const { unitSystem } = useFacility();
  const mayRecord = useMay('air-removal-test.record');
  const chamber = [sterilizer.chamberWidthMm, sterilizer.chamberDepthMm, sterilizer.chamberHeightMm];
  return (
    <div className="grid gap-5">
      <Facts>
        <Fact name="Code">
          <Code>{sterilizer.code}</Code>, number {sterilizer.number} in load numbers
        </Fact>
        <Fact name="Service">
          <ServiceStateWords state={sterilizer.serviceState} />
        </Fact>
        <Fact name="Air removal">
          <AirRemovalWords sterilizer={sterilizer} />
        </Fact>
      </Facts>
      {mayRecord && sterilizer.needsAirRemovalTest && (
        <LinkButton to={`/stock/air-removal?sterilizer=${sterilizer.id}`} size="small" className="justify-self-start">
          Write down an air-removal test
        </LinkButton>
      )}
      <ChamberDrawing sterilizer={sterilizer} />
      <Facts>
        <Fact name="Chamber">
          {formatSize(chamber, unitSystem)}
          <span className="block font-normal text-ink-2">width, depth, height</span>
        </Fact>
        <Fact name="Carts">{sizeClassWords[sterilizer.sizeClass]}</Fact>
        <Fact name="Load mass">at most {formatMass(sterilizer.greatestLoadMassKg, unitSystem)}</Fact>
        <Fact name="Steam line">{sterilizer.steamLine === '' ? 'Not said' : sterilizer.steamLine}</Fact>
        <Fact name="Air detector">{sterilizer.hasAirDetector ? 'Yes' : 'No'}</Fact>
        <Fact name="Qualified for">
          {sterilizer.qualifiedPrograms.length === 0 ? 'Nothing' : sterilizer.qualifiedPrograms.join(', ')}
        </Fact>
        {sterilizer.otherPrograms.length > 0 && (
          <Fact name="On its panel only">{sterilizer.otherPrograms.join(', ')}</Fact>
        )}
      </Facts>
      <ChangeButton onPress={onChange} />
    </div>
  );
}
