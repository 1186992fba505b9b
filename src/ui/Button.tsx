import { buttonClass, type ButtonSize, type ButtonTone } from "./buttonClass";

interface ButtonProps extends React.ComponentProps<"button"> {
  /** One main button a page. */
  tone?: ButtonTone;
  size?: ButtonSize;
  /** Work is under way: the button keeps its place and takes no second press. */
  busy?: boolean;
}

/** A verb to press. */
export function Button({ tone, size, busy = false, className = "", disabled, ...rest }: ButtonProps) {
  return (
    <button
      type="button"
      {...rest}
      aria-busy={busy || undefined}
      disabled={disabled || busy}
      className={`${buttonClass(tone, size)} ${className}`}
    />
  );
}
