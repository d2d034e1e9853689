import { useQuery } from '@tanstack/react-query';
import { PageHead, PanelHead } from '../../../components/ui/heading';
import { LinkButton } from '../../../components/ui/link-button';
import { EmptyState, WaitingState, WrongState } from '../../../components/ui/states';
import { useMay } from '../../../lib/session';
import { useAddress } from '../../../lib/use-address';
import { airRemovalTestQueries } from '../queries';
import { AirRemovalForm } from './air-removal-form';
import { TestList } from './test-list';

/** The day's air-removal test of a sterilizer: written down at the left, the latest ones at the right. */
export function AirRemovalScreen() {
  const { params, write } = useAddress();
  const sterilizerId = params.get('sterilizer');
  const mayRecord = useMay('air-removal-test.record');
  const sterilizers = useQuery(airRemovalTestQueries.sterilizers());
  const latest = useQuery(airRemovalTestQueries.list({ sterilizerId: null }));
  const tests = useQuery(airRemovalTestQueries.list({ sterilizerId }));

  if (sterilizers.isPending || latest.isPending || tests.isPending) {
    return <WaitingState title="Air-removal test" waitsFor="The server has not answered yet." />;
  }
  if (sterilizers.isError || latest.isError || tests.isError) {
    return (
      <div className="p-6">
        <WrongState
          title="The air-removal tests could not be shown"
          error={sterilizers.error ?? latest.error ?? tests.error}
          onTryAgain={() => {
            void sterilizers.refetch();
            void latest.refetch();
            void tests.refetch();
          }}
        />
      </div>
    );
  }
  return (
    <div className="grid gap-6 px-6 py-5 max-tablet:px-4">
      <title>Air-removal test · Paperside</title>
      <PageHead
        title="Air-removal test"
        facts="Each day in the empty chamber, before the first load"
        aside={
          <LinkButton to="/stock/sterilizers" kind="plain" size="small" icon="left">
            Sterilizers
          </LinkButton>
        }
      />
      <div className="grid gap-10 tablet:grid-cols-[minmax(0,1fr)_minmax(0,25rem)]">
        {mayRecord ? (
          <AirRemovalForm
            sterilizers={sterilizers.data}
            sterilizerId={sterilizerId}
            readers={latest.data.readers}
            lastPack={latest.data.tests[0] ?? null}
            onSterilizer={(id) => {
              write({ sterilizer: id });
            }}
          />
        ) : (
          <EmptyState title="Written down by who reads the sheet">
            Technicians, leads, supervisors and engineers write these tests down.
          </EmptyState>
        )}
        <section>
          <PanelHead title="The latest" aside={sterilizerId === null ? 'All sterilizers' : 'This sterilizer'} />
          <TestList tests={tests.data.tests.slice(0, 20)} />
        </section>
      </div>
    </div>
  );
}
