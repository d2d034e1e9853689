import { useState } from 'react';
import { useNavigate, useParams } from 'react-router-dom';
import { PageHead } from '../../components/ui/heading';
import { TabLinks } from '../../components/ui/tabs';
import { KeyInSheet } from '../../features/loads/components/key-in-sheet';
import { OpenLoadSheet } from '../../features/loads/components/open-load-sheet';
import { PackageList } from '../../features/packages/components/package-list';
import { PackageSheet } from '../../features/packages/components/package-sheet';
import { PackingStation } from '../../features/packages/components/packing-station';
import { RunDetail } from '../../features/runs/components/run-detail';
import { RunsBoard } from '../../features/runs/components/runs-board';
import { StageIntoRun, TakeOutOfRun } from '../../features/runs/components/stage-into-run';
import { NotFound } from '../not-found';

const runsAddress = '/pack/runs';

const tabs = [
  { to: '/pack/station', label: 'Packing station' },
  { to: '/pack/packages', label: 'Packages' },
  { to: runsAddress, label: 'Runs' },
];

/** Packing, what is packed, and the runs it waits in: three screens of one place. */
export function Component() {
  const { part, id = null } = useParams();
  const navigate = useNavigate();
  const [packageRef, setPackageRef] = useState<string | null>(null);
  const [openingRunId, setOpeningRunId] = useState<string | null>(null);

  function screen() {
    switch (part) {
      case 'station':
        return (
          <PackingStation
            stagingOf={(packageIds) => (
              <StageIntoRun key={packageIds[0]} packageIds={packageIds} runsAddress={runsAddress} />
            )}
            onPackage={(one) => {
              setPackageRef(one.id);
            }}
            keyInOf={(props) => <KeyInSheet {...props} />}
          />
        );
      case 'packages':
        return (
          <PackageList
            onOpen={(one) => {
              setPackageRef(one.id);
            }}
          />
        );
      case 'runs':
        return (
          <RunsBoard
            chosenId={id}
            boardAddress={runsAddress}
            addressOf={(runId) => `${runsAddress}/${runId}`}
            onChoose={(runId) => {
              void navigate(`${runsAddress}/${runId}`);
            }}
            detailOf={(runId) => (
              <RunDetail
                runId={runId}
                onPackage={(one) => {
                  setPackageRef(one.id);
                }}
                onDropped={() => {
                  void navigate(runsAddress);
                }}
                onOpenLoad={() => {
                  setOpeningRunId(runId);
                }}
                keyInOf={(props) => <KeyInSheet {...props} />}
              />
            )}
          />
        );
      default:
        return null;
    }
  }

  const shown = screen();
  if (shown === null) return <NotFound />;
  return (
    <div className="grid gap-4 px-6 pt-4 pb-5 max-tablet:px-4 tablet:h-full tablet:min-h-0 tablet:grid-rows-[auto_minmax(0,1fr)]">
      <title>Pack · Paperside</title>
      <div className="flex flex-wrap items-end justify-between gap-x-8 gap-y-2">
        <PageHead title="Pack" />
        <TabLinks label="Packing" links={tabs} />
      </div>
      <div className="min-h-0 tablet:overflow-y-auto">{shown}</div>
      {packageRef !== null && (
        <PackageSheet
          packageRef={packageRef}
          onClose={() => {
            setPackageRef(null);
          }}
          stagingOf={({ package: one }) =>
            one.state === 'packed' ? (
              <StageIntoRun packageIds={[one.id]} runsAddress={runsAddress} />
            ) : one.state === 'staged' && one.run !== null && one.openLoad === null ? (
              <TakeOutOfRun packageId={one.id} run={one.run} />
            ) : null
          }
        />
      )}
      {openingRunId !== null && (
        <OpenLoadSheet
          runId={openingRunId}
          onClose={() => {
            setOpeningRunId(null);
          }}
        />
      )}
    </div>
  );
}
