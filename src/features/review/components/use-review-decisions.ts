import { useState } from 'react';
import type { ReviewDecision, ReviewQueueItem } from '#shared/contracts/review.ts';
import { useToast } from '#src/components/toast.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useDecide, useUndoDecision } from '../api/review.ts';
import { decisionWords } from './review-words.ts';

/** Deciding and taking back, with what is told about it. */
export function useReviewDecisions(siteId: number, onUndone: (screeningId: number) => void) {
  const decide = useDecide(siteId);
  const undo = useUndoDecision(siteId);
  const notify = useToast();
  const [lastId, setLastId] = useState<number | null>(null);
  const takeBack = (screeningId: number) =>
    undo.mutate(screeningId, {
      onSuccess: () => {
        setLastId(null);
        onUndone(screeningId);
        notify({ text: 'The decision is taken back; the flag waits again.' });
      },
      onError: (error) => notify({ failed: true, text: toApiError(error).message }),
    });
  return {
    busy: decide.isPending || undo.isPending,
    undoLast: () => {
      if (lastId !== null) takeBack(lastId);
    },
    takeBack,
    decide: (item: ReviewQueueItem, decision: ReviewDecision, reason: string, then: () => void) =>
      decide.mutate(
        { screeningId: item.screeningId, decision, reason },
        {
          onSuccess: ({ findingId, findingIsNew }) => {
            setLastId(item.screeningId);
            then();
            const finding =
              findingId === null
                ? ''
                : findingIsNew
                  ? ` Finding ${findingId} is open.`
                  : ` Finding ${findingId} is extended.`;
            notify({
              text: `${item.pointLabel}: ${decisionWords[decision].toLowerCase()}.${finding}`,
              action: { label: 'Undo', onAction: () => takeBack(item.screeningId) },
            });
          },
          onError: (error) => notify({ failed: true, text: toApiError(error).message }),
        },
      ),
  };
}
