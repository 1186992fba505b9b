import { useState } from "react";
import { Link } from "react-router-dom";
import type { Account, DemoAccount, SessionResponse } from "../../../shared/schemas/session";
import { ApiError, failureSentence } from "../../lib/ApiError";
import { Button } from "../../ui/Button";
import { Field } from "../../ui/Field";
import { Message } from "../../ui/Message";
import { PasswordField } from "../../ui/PasswordField";
import { useSignIn } from "./accountQueries";
import { SignInFrame } from "./SignInFrame";

interface SignInPageProps {
  demo: readonly DemoAccount[] | null;
  onSignedIn: (session: SessionResponse) => void;
  /** Whose session has ended while a page was open: the page waits behind this one. */
  ended?: Account;
}

/** Signing in, by password or as one of the demonstration's people. */
export function SignInPage({ demo, onSignedIn, ended }: SignInPageProps) {
  const [email, setEmail] = useState(ended?.email ?? "");
  const [password, setPassword] = useState("");
  const signIn = useSignIn(onSignedIn);

  function handleSubmit(event: React.FormEvent) {
    event.preventDefault();
    if (signIn.isPending) return;
    signIn.mutate({ email: email.trim(), password });
  }

  return (
    <SignInFrame title="Sign in">
      <h1 className="pt-18 pb-24 font-serif text-[34px]/[40px]">Sign in</h1>
      {ended && (
        <Message state="waits" live="polite" className="mb-12">
          Your session has ended, {ended.name}. The page you were on waits as you left it; sign in to go on.
        </Message>
      )}
      {signIn.isError && (
        <Message state="fault" live="assertive" className="mb-12">
          {signInFailure(signIn.error)}
        </Message>
      )}
      <form onSubmit={handleSubmit} className="grid gap-12" aria-label="Sign in">
        <Field
          label="E-mail"
          type="email"
          name="email"
          autoComplete="username"
          autoFocus={!ended}
          required
          value={email}
          onChange={(event) => setEmail(event.target.value)}
        />
        <PasswordField
          label="Password"
          name="password"
          autoComplete="current-password"
          autoFocus={ended !== undefined}
          required
          value={password}
          onChange={(event) => setPassword(event.target.value)}
        />
        <div className="pt-10">
          <Button tone="main" type="submit" busy={signIn.isPending}>
            Sign in
          </Button>
        </div>
      </form>
      {demo && demo.length > 0 && (
        <section className="mt-44 border-t border-rule pt-16" aria-labelledby="demo-heading">
          <h2 id="demo-heading" className="pb-6 font-sans text-[13px]/[18px] font-semibold">
            Or look round as
          </h2>
          <ul>
            {demo.map((person) => (
              <li key={person.email} className="flex flex-wrap items-baseline justify-between gap-x-12 py-5">
                <button
                  type="button"
                  disabled={signIn.isPending}
                  onClick={() => signIn.mutate({ email: person.email })}
                  className="border-0 bg-transparent p-0 font-serif text-[17px]/[24px] text-dusk underline decoration-transparent underline-offset-[.18em] transition-colors hover:decoration-current disabled:cursor-progress"
                >
                  {person.name}
                </button>
                <span className="type-meta text-ink2">{person.part}</span>
              </li>
            ))}
          </ul>
          <p className="pt-8 type-label text-ink3">Demonstration accounts of an invented group.</p>
        </section>
      )}
      <p className="flex flex-wrap gap-x-18 gap-y-6 pt-28 type-label">
        <Link to="/accounts/new" className="no-underline hover:underline">
          Create an account
        </Link>
        {!ended && (
          <Link to="/handbook" className="no-underline hover:underline">
            Handbook, open to everyone
          </Link>
        )}
      </p>
    </SignInFrame>
  );
}

/** The complaints about the fields where there are any, else the server’s sentence. */
function signInFailure(error: unknown): string {
  return error instanceof ApiError && error.issues.length > 0
    ? error.issues.map((issue) => issue.message).join(" ")
    : failureSentence(error);
}
