import { useNavigate, useSearchParams } from 'react-router-dom';
import { Wordmark } from '../components/wordmark';
import { AnnotatedBeat } from '../features/sign-in/annotated-beat';
import { SignInForm } from '../features/sign-in/sign-in-form';
import { paths } from '../lib/paths';

/** Only addresses of our own are followed. */
function safeTarget(from: string | null): string | null {
  return from && from.startsWith('/') && !from.startsWith('//') ? from : null;
}

export function Component() {
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const enter = (): void => {
    void navigate(safeTarget(search.get('from')) ?? paths.start(), { replace: true });
  };
  return (
    <div className="grid min-h-dvh tablet:grid-cols-[minmax(340px,1fr)_minmax(0,1fr)] desk:grid-cols-[minmax(380px,1fr)_2fr]">
      <main className="flex flex-col px-6 py-8 tablet:px-10 desk:px-16">
        <Wordmark />
        {/* From the top, not centred: what arrives below must not move what somebody is about to press. */}
        <div className="mb-auto w-full max-w-90 pt-[max(2.5rem,13dvh)] pb-10">
          <h1 className="text-display font-semibold tracking-[-0.012em]">Sign in</h1>
          <p className="mt-1 mb-6 text-section text-ink-2">
            Paced strips to order: you know what is true of every beat.
          </p>
          <SignInForm onSignedIn={enter} />
        </div>
        <p className="max-w-90 text-caption text-ink-3">
          For education only. Synthetic teaching strips, not patient recordings. Not for diagnosis,
          monitoring, device programming or treatment. Follow local protocols, the manufacturer’s instructions
          and licensed practice.
        </p>
      </main>
      <aside
        aria-label="A paced beat"
        className="relative hidden overflow-hidden border-l border-rule-strong tablet:block"
      >
        <div className="absolute inset-0">
          <AnnotatedBeat />
        </div>
        <p className="absolute right-4 bottom-3 bg-paper px-2 text-caption text-ink-2">
          Synthetic teaching strip, not a patient recording
        </p>
      </aside>
    </div>
  );
}
