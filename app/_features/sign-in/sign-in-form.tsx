'use client';

import { signIn } from 'next-auth/react';
import { useState, type FormEvent, type RefObject } from 'react';

import { Button } from '@/app/_ui/button';
import { Field } from '@/app/_ui/field';

/** What is typed to sign in. */
export interface Credentials {
  readonly email: string;
  readonly password: string;
  readonly code: string;
}

interface SignInFormProps {
  readonly typed: Credentials;
  readonly onType: (typed: Credentials) => void;
  readonly submitRef: RefObject<HTMLButtonElement | null>;
}

const noAnswer = 'Not signed in: the server did not answer. Try again when the link is back.';

/** E-mail, password and code. Sent by script; the method keeps a password out of the address when the script is late. */
export function SignInForm({ typed, onType, submitRef }: SignInFormProps) {
  const [problem, setProblem] = useState<string | null>(null);
  const [isSending, setIsSending] = useState(false);
  const set = (key: keyof Credentials) => (event: FormEvent<HTMLInputElement>) => onType({ ...typed, [key]: event.currentTarget.value });

  const handleSubmit = async (event: FormEvent) => {
    event.preventDefault();
    if (isSending) return;
    setIsSending(true);
    setProblem(null);
    const credentials = { email: typed.email.trim(), password: typed.password, code: typed.code.replaceAll(' ', '') };
    const reply = await signIn('credentials', { ...credentials, redirect: false }).catch(() => null);
    if (reply?.ok === true && !reply.error) {
      window.location.assign(wantedPage());
      return;
    }
    setProblem(reply?.error ?? noAnswer);
    setIsSending(false);
  };
  return (
    <form method="post" onSubmit={(event) => void handleSubmit(event)} className="flex flex-col gap-4">
      <Field label="E-mail" name="email" type="email" autoComplete="username" required value={typed.email} onChange={set('email')} />
      <Field label="Password" name="password" type="password" autoComplete="current-password" required value={typed.password} onChange={set('password')} />
      <Field label="Code, six digits" name="code" isNumeric inputMode="numeric" autoComplete="one-time-code" required value={typed.code} onChange={set('code')} />
      {problem === null ? null : <p role="alert" className="border-l-4 border-ink pl-3 font-semibold">{problem}</p>}
      <Button ref={submitRef} type="submit" variant="primary" disabled={isSending} className="self-start">
        {isSending ? 'Signing in' : 'Sign in'}
      </Button>
    </form>
  );
}

/** The page that was asked for before, when it is one of ours; else the start, which leads each person to their page. */
function wantedPage(): string {
  const wanted = new URLSearchParams(window.location.search).get('next') ?? '';
  return /^\/(?![/\\])[\w/-]*$/.test(wanted) ? wanted : '/';
}
