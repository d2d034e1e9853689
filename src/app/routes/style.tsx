import { PageHead } from '../../components/ui/heading';
import { Clock } from '../../components/ui/time';
import { Answers, States } from '../style/answers-and-states';
import { Buttons, Fields } from '../style/controls';
import { Lists, TypeAndColour } from '../style/lists-and-type';
import { Stripes } from '../style/stripes';

/** Everything that has a look or a state, on one page. In development only. */
export function Component() {
  return (
    <main className="bg-fibre h-dvh overflow-auto bg-paper-1 px-5 py-7 tablet:px-9">
      <title>States and key · Paperside</title>
      <PageHead
        title="States and key"
        facts="One page of everything that has a state. Nothing is told by colour alone."
        aside={<Clock withSeconds />}
      />
      <Stripes />
      <Answers />
      <States />
      <Buttons />
      <Fields />
      <Lists />
      <TypeAndColour />
    </main>
  );
}
