import type { ComponentProps } from "react";
import { buttonClass, type ButtonLook } from "./button-class.ts";

type Props = ComponentProps<"button"> & ButtonLook;

export function Button({ look, wide, className, type = "button", ...rest }: Props) {
  return <button {...rest} type={type} className={buttonClass({ look, wide }, className)} />;
}
