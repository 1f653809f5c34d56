import { useQuery } from '@tanstack/react-query';
import { ErrorState } from '#src/components/error-state.tsx';
import { Skeleton } from '#src/components/skeleton.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { seatsQuery } from '../api/seats.ts';
import { SeatsView } from './seats-view.tsx';

/** The seats of a position outside any finding, for the machine page. */
export function PositionSeats({ siteId, positionId }: { siteId: number; positionId: number }) {
  const seats = useQuery(seatsQuery(siteId, positionId));
  if (seats.isError) {
    const error = toApiError(seats.error);
    return <ErrorState title={error.message} advice="Reload the page." errorId={error.id} />;
  }
  if (seats.data === undefined) return <Skeleton label="Loading the seats…" />;
  return <SeatsView assessment={seats.data} />;
}
