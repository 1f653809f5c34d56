import { useState } from 'react';
import type { ReviewDecision, ReviewQueueItem } from '#shared/contracts/review.ts';
import { useToast } from '#src/components/toast.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useDecide, useUndoDecision } from '../api/review.ts';
import { decisionWords } from './review-words.ts';

export interface LastDecision {
  screeningId: number;
  /** What was done, in words. */
  text: string;
}

/** Deciding and taking back, with the last decision at hand for undoing. */
export function useReviewDecisions(siteId: number, onUndone: (screeningId: number) => void) {
  const decide = useDecide(siteId);
  const undo = useUndoDecision(siteId);
  const notify = useToast();
  const [last, setLast] = useState<LastDecision | null>(null);
  const tellFailure = (error: unknown) => notify({ failed: true, text: toApiError(error).message });
  const takeBack = (screeningId: number) =>
    undo.mutate(screeningId, {
      onSuccess: () => {
        setLast(null);
        onUndone(screeningId);
        notify({ text: 'The decision is taken back; the flag waits again.' });
      },
      onError: tellFailure,
    });
  return {
    busy: decide.isPending || undo.isPending,
    last,
    undoLast: () => {
      if (last !== null) takeBack(last.screeningId);
    },
    takeBack,
    decide: (item: ReviewQueueItem, decision: ReviewDecision, reason: string, then: () => void) =>
      decide.mutate(
        { screeningId: item.screeningId, decision, reason },
        {
          onSuccess: ({ findingId, findingIsNew }) => {
            const word = findingIsNew ? 'is open' : 'is extended';
            const finding = findingId === null ? '' : ` Finding ${findingId} ${word}.`;
            setLast({
              screeningId: item.screeningId,
              text: `${item.pointLabel}: ${decisionWords[decision].toLowerCase()}.${finding}`,
            });
            then();
          },
          onError: tellFailure,
        },
      ),
  };
}
