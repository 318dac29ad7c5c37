import { MIN_PASSWORD_LENGTH } from "../../../shared/schemas/auth.ts";
import { PasswordField } from "./password-field.tsx";

interface Props {
  label: string;
  error?: string;
  value: string;
  onChange: (value: string) => void;
}

/** A password to be chosen; the server refuses those that somebody would try first. */
export function NewPasswordField(props: Props) {
  return (
    <PasswordField
      {...props}
      hint={`At least ${MIN_PASSWORD_LENGTH} characters; a few words in a row are good.`}
      autoComplete="new-password"
    />
  );
}
