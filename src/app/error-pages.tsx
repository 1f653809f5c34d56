import { useEffect } from 'react';
import { isRouteErrorResponse, useRouteError } from 'react-router-dom';
import { ButtonLink } from '#src/components/button-link.tsx';
import { Button } from '#src/components/button.tsx';
import { ErrorState, type ErrorStateProps } from '#src/components/error-state.tsx';
import { ApiError } from '#src/lib/api-error.ts';

const reload = (
  <Button variant="primary" icon="retry" onClick={() => window.location.reload()}>
    Load the page again
  </Button>
);
const home = <ButtonLink to="/">Start page</ButtonLink>;

/** What a failed route shows, by what went wrong; the words promise only what is so. */
export function errorPageOf(error: unknown): ErrorStateProps {
  if (isNotFound(error)) {
    return {
      title: 'This page is not here.',
      advice:
        'The address may be mistyped, or what it showed was removed or belongs to a site you are not a member of.',
      action: home,
    };
  }
  if (error instanceof ApiError && error.code === 'forbidden') {
    return {
      title: 'Your role does not open this page.',
      advice: 'Ask the reliability lead of the site if you need it.',
      action: home,
    };
  }
  if (error instanceof ApiError && error.code === 'unreachable') {
    return {
      title: 'The server can’t be reached.',
      safe: 'What was saved before is safe on the server.',
      advice: 'Check the connection, then load the page again.',
      action: reload,
    };
  }
  if (error instanceof ApiError) {
    return {
      title: error.message,
      safe: 'What was saved before is safe.',
      advice: 'Load the page again. If it happens again, pass on the error’s number.',
      errorId: error.id,
      action: (
        <>
          {reload}
          {home}
        </>
      ),
    };
  }
  return {
    title: 'This page broke down.',
    safe: 'What was saved before is safe; what was typed on this page may be gone.',
    advice: 'Load the page again. If it breaks again, tell whoever looks after Fretline here.',
    action: (
      <>
        {reload}
        {home}
      </>
    ),
  };
}

/** The `errorElement` of every route. */
export function RouteErrorPage() {
  const error = useRouteError();
  return <ErrorPage {...errorPageOf(error)} />;
}

/** The route `*`. */
export function NotFoundPage() {
  return <ErrorPage {...errorPageOf(new ApiError('not_found', '', { status: 404 }))} />;
}

function ErrorPage(props: ErrorStateProps) {
  useEffect(() => {
    document.title = `${props.title} – Fretline`;
  }, [props.title]);
  return (
    <div className="mx-auto max-w-2xl px-4 py-16">
      <h1 className="sr-only">{props.title}</h1>
      <ErrorState {...props} />
    </div>
  );
}

function isNotFound(error: unknown): boolean {
  return error instanceof ApiError
    ? error.code === 'not_found'
    : isRouteErrorResponse(error) && error.status === 404;
}
