let running: Promise<boolean> | null = null;

/**
 * Renews the session once, however many requests found it ended at the same time: the refresh token
 * changes with every use, so a second renewal with the old one would end the session for good.
 *
 * @returns whether the requests may be tried again
 */
export function refreshSession(): Promise<boolean> {
  running ??= fetch('/api/session/refresh', {
    method: 'POST',
    credentials: 'same-origin',
    headers: { accept: 'application/json' },
  })
    .then(
      async (answer) => {
        // An unread body keeps the connection busy.
        await answer.text();
        return answer.ok;
      },
      () => false,
    )
    .finally(() => {
      running = null;
    });
  return running;
}
