import { TextField } from "../../ui/text-field.tsx";

interface Props {
  error?: string;
  value: string;
  onChange: (value: string) => void;
}

export function EmailField({ onChange, ...props }: Props) {
  return (
    <TextField
      label="E-mail"
      type="email"
      inputMode="email"
      autoComplete="username"
      autoCapitalize="none"
      spellCheck={false}
      {...props}
      onChange={(event) => onChange(event.target.value.trim())}
    />
  );
}
