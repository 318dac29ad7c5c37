import type { ComponentProps } from "react";
import { Link } from "react-router-dom";
import { buttonClass, type ButtonLook } from "./button-class.ts";

type Props = ComponentProps<typeof Link> & ButtonLook;

/** A link that looks like a button: it goes somewhere and changes nothing. */
export function ButtonLink({ look, wide, className, ...rest }: Props) {
  return <Link {...rest} className={buttonClass({ look, wide }, className)} />;
}
