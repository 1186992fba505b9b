import { Link, type LinkProps } from "react-router-dom";
import { linkButtonClass, type ButtonSize, type ButtonTone } from "./buttonClass";

interface LinkButtonProps extends LinkProps {
  tone?: ButtonTone;
  size?: ButtonSize;
}

/** A link to another page that stands where a button would. */
export function LinkButton({ tone, size, className = "", ...rest }: LinkButtonProps) {
  return <Link {...rest} className={`${linkButtonClass(tone, size)} ${className}`} />;
}
