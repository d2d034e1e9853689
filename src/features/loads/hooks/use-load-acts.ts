import type { ScanPlace, ScanResponse } from '#contract/loads';
import type { LoadEdit } from '#domain/load/finding';
import { startTransition, useCallback, useRef, useState } from 'react';
import { useAnnounce } from '../../../components/ui/announcer';
import { sentenceOf } from '../../../lib/errors';
import { newRequestId } from '../../../lib/request-id';
import type { ScanEntry } from '../../../lib/scanner-input';
import { useSounds } from '../../../lib/sounds';
import { lookOf } from '../answers';
import type { LastScan } from '../components/scan-line';
import { useEditLoad, useScanIntoLoad, useUndoLastAct } from '../mutations';

const shownCode = 40;

/** Scanning, editing and taking back at one station: what was answered last, the current place, and what is under way. */
export function useLoadActs(loadId: string) {
  const announce = useAnnounce();
  const sounds = useSounds();
  const send = useScanIntoLoad(loadId);
  const editMutation = useEditLoad(loadId);
  const undoMutation = useUndoLastAct(loadId);
  const [place, setPlace] = useState<ScanPlace | null>(null);
  const [last, setLast] = useState<LastScan>({ kind: 'none' });
  const [waiting, setWaiting] = useState(0);
  const [problem, setProblem] = useState<string | null>(null);
  const turn = useRef(0);
  // Two scans may follow each other faster than the screen is drawn: the second must know the place the first has set.
  const placeNow = useRef<ScanPlace | null>(null);

  const choosePlace = useCallback((next: ScanPlace | null) => {
    placeNow.current = next;
    setPlace(next);
  }, []);

  const answered = useCallback(
    (reply: ScanResponse) => {
      turn.current += 1;
      setLast({ kind: 'answered', turn: turn.current, reply });
      if (reply.answer === 'place-set' && reply.place) choosePlace(reply.place);
      const { sound, look } = lookOf(reply);
      sounds.play(sound);
      const isNo = look !== 'taken' && look !== 'look' && look !== 'place';
      announce(`${reply.package?.itemName ?? ''} ${reply.sentence}`.trim(), isNo ? 'assertive' : 'polite');
    },
    [announce, choosePlace, sounds],
  );

  const queue = useRef<Promise<unknown>>(Promise.resolve());
  const scan = useCallback(
    (raw: string, entry: ScanEntry) => {
      // Told when there is time: first the scan has to be on its way.
      startTransition(() => {
        setWaiting((count) => count + 1);
      });
      const requestId = newRequestId();
      // One after the other: a package scanned right after its place must not be sent before the place is known.
      queue.current = queue.current.then(async () => {
        try {
          answered(await send({ requestId, raw, entry, place: placeNow.current }));
        } catch (error) {
          turn.current += 1;
          const sentence = sentenceOf(error);
          setLast({ kind: 'refused', turn: turn.current, sentence, code: raw.slice(0, shownCode) });
          sounds.play('not-taken');
          announce(sentence, 'assertive');
        } finally {
          startTransition(() => {
            setWaiting((count) => count - 1);
          });
        }
      });
    },
    [announce, answered, send, sounds],
  );

  const { mutate: edit } = editMutation;
  const applyEdits = useCallback(
    (edits: readonly LoadEdit[], onDone?: () => void) => {
      setProblem(null);
      edit(edits, {
        onSuccess: () => {
          sounds.play('taken');
          onDone?.();
        },
        onError: (error) => {
          setProblem(sentenceOf(error));
          announce(sentenceOf(error), 'assertive');
        },
      });
    },
    [announce, edit, sounds],
  );

  const { mutate: takeBack } = undoMutation;
  const undo = useCallback(
    (undoing: string) => {
      setProblem(null);
      takeBack(undoing, {
        onSuccess: () => {
          announce('Taken back.');
          setLast({ kind: 'none' });
        },
        onError: (error) => {
          setProblem(sentenceOf(error));
          announce(sentenceOf(error), 'assertive');
        },
      });
    },
    [announce, takeBack],
  );

  const forgetProblem = useCallback(() => {
    setProblem(null);
  }, []);

  return {
    place,
    choosePlace,
    last,
    waiting,
    scan,
    applyEdits,
    undo,
    problem,
    forgetProblem,
    isEditing: editMutation.isPending,
  };
}

export type LoadActs = ReturnType<typeof useLoadActs>;
