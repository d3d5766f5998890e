import { isRouteErrorResponse, Link, useRouteError } from 'react-router-dom';
import { ApiError } from '../api/http';
import { buttonClass } from '../components/button';
import { paths } from '../lib/paths';

interface Words {
  title: string;
  text: string;
}

function wordsFor(error: unknown): Words {
  const id = error instanceof ApiError ? error.id : isRouteErrorResponse(error) ? String(error.data) : '';
  switch (id) {
    case 'notAllowed':
      return {
        title: 'This page is not for your role',
        text: 'Strips are shaped by educators and simulation technicians. Ask an administrator if you need to.',
      };
    case 'notFound':
      return { title: 'There is nothing here', text: 'It was moved or deleted, or the address is mistyped.' };
    case 'offline':
      return {
        title: 'The server cannot be reached',
        text: 'Nothing is lost. Check the connection and try again.',
      };
    default:
      return {
        title: 'Something went wrong',
        text: 'Nothing you saved is lost. Try again; if it stays, tell the administrator.',
      };
  }
}

/** What happened, what is kept, and the way on. */
export function ErrorPage() {
  const { title, text } = wordsFor(useRouteError());
  return (
    <main className="mx-auto max-w-xl px-4 py-16 tablet:px-6">
      <h1 className="text-title font-semibold tracking-[-0.012em]">{title}</h1>
      <p className="mt-2 text-body text-ink-2">{text}</p>
      <div className="mt-6 flex flex-wrap gap-3">
        <button type="button" className={buttonClass('plain')} onClick={() => window.location.reload()}>
          Try again
        </button>
        <Link to={paths.help()} className={buttonClass('quiet')}>
          Help
        </Link>
      </div>
    </main>
  );
}
