import { ApiError } from '../../api/http';

/** Why signing in failed, and what to do. */
export function signInWords(error: unknown): string {
  if (!(error instanceof ApiError)) return 'Something went wrong. Try again.';
  switch (error.id) {
    case 'signInFailed':
      return 'E-mail or password is not right. Check both and try again.';
    case 'tooManyAttempts': {
      const minutes = Math.max(1, Math.ceil((error.retryAfterS ?? 60) / 60));
      return `Too many attempts. Wait ${minutes} ${minutes === 1 ? 'minute' : 'minutes'}, then try again.`;
    }
    case 'offline':
      return 'The server cannot be reached. Check the connection and try again.';
    default:
      return error.message;
  }
}
