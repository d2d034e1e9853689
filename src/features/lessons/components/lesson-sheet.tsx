import type { RuleId } from '#domain/load/finding';
import { ruleOf } from '#domain/lessons/all-lessons';
import { readingSeconds } from '#domain/lessons/reading-time';
import { Button } from '../../../components/ui/button';
import { Dialog } from '../../../components/ui/dialog';
import { LessonBody } from './lesson-body';

type LessonSheetProps = {
  readonly ruleId: RuleId;
  readonly loadId: string;
  readonly onClose: () => void;
};

/** A lesson over a load. The load below keeps all it has, and goes on taking scans. */
export function LessonSheet({ ruleId, loadId, onClose }: LessonSheetProps) {
  return (
    <Dialog isOpen onClose={onClose} title={ruleOf(ruleId).name} size="full">
      <p className="mb-3 text-small text-ink-2">Read in about {readingSeconds(ruleId)} s.</p>
      <LessonBody
        ruleId={ruleId}
        loadId={loadId}
        wayOn={
          <Button kind="quiet" onPress={onClose}>
            Back to the load
          </Button>
        }
      />
    </Dialog>
  );
}
