import { TextField } from "../../ui/text-field.tsx";

interface Props {
  label?: string;
  autoComplete?: "username" | "email";
  error?: string;
  value: string;
  onChange: (value: string) => void;
}

export function EmailField({ onChange, ...props }: Props) {
  return (
    <TextField
      label="E-mail"
      autoComplete="username"
      type="email"
      inputMode="email"
      autoCapitalize="none"
      spellCheck={false}
      {...props}
      onChange={(event) => onChange(event.target.value.trim())}
    />
  );
}
