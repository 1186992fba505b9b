import { useState } from "react";
import { Field } from "./Field";
import { TextButton } from "./TextButton";

/** A field for a password, which can be shown. */
export function PasswordField(props: Omit<React.ComponentProps<typeof Field>, "type" | "trailing">) {
  const [shown, setShown] = useState(false);
  return (
    <Field
      {...props}
      type={shown ? "text" : "password"}
      autoCapitalize="none"
      spellCheck={false}
      trailing={
        <TextButton
          onClick={() => setShown(!shown)}
          aria-label={shown ? "Hide the password" : "Show the password"}
        >
          {shown ? "hide" : "show"}
        </TextButton>
      }
    />
  );
}
