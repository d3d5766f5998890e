import { zodResolver } from '@hookform/resolvers/zod';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import type { DemoAccount } from '../../../shared/api/demo';
import { roleNames } from '../../../shared/api/roles';
import { signInRequestSchema, type SignInRequest } from '../../../shared/api/session';
import { demoQuery, sessionKeys, signIn } from '../../api/session';
import { Button, buttonClass } from '../../components/button';
import { Notice } from '../../components/notice';
import { TextField } from '../../components/text-field';
import { signInWords } from './sign-in-words';

/** The first account of each role. */
function onePerRole(accounts: readonly DemoAccount[]): DemoAccount[] {
  return accounts.filter((account, i) => accounts.findIndex((one) => one.role === account.role) === i);
}

/** E-mail and password, and the people of the demonstration where there is one. */
export function SignInForm({ onSignedIn }: { onSignedIn(): void }) {
  const queryClient = useQueryClient();
  const [shown, setShown] = useState(false);
  const { data: demo } = useQuery(demoQuery);
  const { register, handleSubmit, formState } = useForm<SignInRequest>({
    resolver: zodResolver(signInRequestSchema),
    defaultValues: { email: '', password: '' },
  });
  const entering = useMutation({
    mutationFn: signIn,
    onSuccess: (user) => {
      queryClient.clear();
      queryClient.setQueryData(sessionKeys.session, user);
      onSignedIn();
    },
  });
  const enter = (request: SignInRequest): void => entering.mutate(request);
  return (
    <>
      <form className="flex flex-col gap-4" noValidate onSubmit={(event) => void handleSubmit(enter)(event)}>
        {entering.isError && (
          <Notice kind="red" title="Not signed in.">
            {signInWords(entering.error)}
          </Notice>
        )}
        <TextField
          large
          label="E-mail"
          type="email"
          autoComplete="username"
          error={formState.errors.email && 'Give the e-mail address you were invited by.'}
          {...register('email')}
        />
        <TextField
          large
          label="Password"
          type={shown ? 'text' : 'password'}
          autoComplete="current-password"
          error={formState.errors.password && 'Give your password.'}
          end={
            <button
              type="button"
              className="px-1 text-body font-medium text-teal-dark"
              onClick={() => setShown(!shown)}
            >
              {shown ? 'Hide' : 'Show'}
            </button>
          }
          {...register('password')}
        />
        <Button kind="primary" type="submit" className="h-11 text-section" disabled={entering.isPending}>
          {entering.isPending ? 'Signing in …' : 'Sign in'}
        </Button>
      </form>
      {demo && demo.accounts.length > 0 && (
        <section aria-label="Demonstration" className="mt-7 border-t border-rule-strong pt-5">
          <p className="text-body font-semibold">Demonstration college</p>
          <p className="text-body text-ink-2">Enter as one of its people:</p>
          <div className="mt-2.5 flex flex-wrap gap-2">
            {onePerRole(demo.accounts).map((account) => (
              <button
                key={account.email}
                type="button"
                className={buttonClass('plain')}
                disabled={entering.isPending}
                onClick={() => enter({ email: account.email, password: account.password })}
              >
                {roleNames[account.role]}
              </button>
            ))}
          </div>
        </section>
      )}
    </>
  );
}
