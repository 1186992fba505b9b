import { useState } from "react";
import { Link } from "react-router-dom";
import { createAccountBody } from "../../../shared/schemas/accounts";
import { passwordLimits, type SessionResponse } from "../../../shared/schemas/session";
import { ApiError, failureSentence } from "../../lib/ApiError";
import { Button } from "../../ui/Button";
import { Field } from "../../ui/Field";
import { Message } from "../../ui/Message";
import { PasswordField } from "../../ui/PasswordField";
import { useCreateAccount } from "./accountQueries";
import { SignInFrame } from "./SignInFrame";

type FieldName = "name" | "email" | "password";

interface CreateAccountPageProps {
  onSignedIn: (session: SessionResponse) => void;
  /** Accepted in the same act; it is for one address. */
  invitation?: { token: string; email: string; name: string } | null;
}

/** Opening an account; who has one is signed in at once. */
export function CreateAccountPage({ onSignedIn, invitation = null }: CreateAccountPageProps) {
  const [fields, setFields] = useState<Record<FieldName, string>>({
    name: "",
    email: invitation?.email ?? "",
    password: "",
  });
  const [complaints, setComplaints] = useState<Partial<Record<FieldName, string>>>({});
  const create = useCreateAccount(onSignedIn);

  const serverSays = create.error instanceof ApiError ? create.error : null;
  const fieldNames = ["name", "email", "password"] as const;
  const isAboutFields = fieldNames.some((field) => serverSays?.issueAt(field));

  function handleChange(event: React.ChangeEvent<HTMLInputElement>) {
    setFields({ ...fields, [event.target.name]: event.target.value });
    setComplaints({ ...complaints, [event.target.name]: undefined });
    if (create.isError) create.reset();
  }

  function handleSubmit(event: React.FormEvent) {
    event.preventDefault();
    const parsed = createAccountBody.safeParse(
      invitation ? { ...fields, invitation: invitation.token } : fields,
    );
    if (parsed.success) {
      create.mutate(parsed.data);
      return;
    }
    const found: Partial<Record<FieldName, string>> = {};
    for (const issue of parsed.error.issues) found[issue.path[0] as FieldName] ??= issue.message;
    setComplaints(found);
  }

  const faultOf = (field: FieldName): string | undefined => complaints[field] ?? serverSays?.issueAt(field);

  return (
    <SignInFrame title="Create an account">
      <h1 className="pt-18 pb-24 font-serif text-[34px]/[40px]">Create an account</h1>
      {create.isError && !isAboutFields && (
        <Message state="fault" live="assertive" className="mb-12">
          {failureSentence(create.error)}
        </Message>
      )}
      <form onSubmit={handleSubmit} noValidate className="grid gap-12" aria-label="Create an account">
        <Field
          label="Name"
          name="name"
          autoComplete="name"
          autoFocus
          value={fields.name}
          onChange={handleChange}
          fault={faultOf("name")}
          hint="As it is to stand on notebooks."
        />
        <Field
          label="E-mail"
          name="email"
          type="email"
          autoComplete="username"
          value={fields.email}
          onChange={handleChange}
          readOnly={invitation !== null}
          fault={faultOf("email")}
          hint={invitation ? `The invitation to ${invitation.name} is for this address.` : undefined}
        />
        <PasswordField
          label="Password"
          name="password"
          autoComplete="new-password"
          value={fields.password}
          onChange={handleChange}
          fault={faultOf("password")}
          hint={`At least ${passwordLimits.shortest} characters; a few words make a good one.`}
        />
        <div className="pt-10">
          <Button tone="main" type="submit" busy={create.isPending}>
            Create the account
          </Button>
        </div>
      </form>
      <p className="pt-28 type-label">
        <Link to="/notebooks" className="no-underline hover:underline">
          Sign in to an account
        </Link>
      </p>
    </SignInFrame>
  );
}
