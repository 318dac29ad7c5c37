import { useState } from "react";
import { TextField } from "../../ui/text-field.tsx";
import { Tick } from "../../ui/tick.tsx";

interface Props {
  label: string;
  hint?: string;
  error?: string;
  value: string;
  onChange: (value: string) => void;
  autoComplete: "new-password" | "current-password";
}

/** A password that one may look at: gloves and small keys make typing it blind a guess. */
export function PasswordField({ onChange, ...props }: Props) {
  const [shown, setShown] = useState(false);
  return (
    <div>
      <TextField
        {...props}
        type={shown ? "text" : "password"}
        autoCapitalize="none"
        spellCheck={false}
        onChange={(event) => onChange(event.target.value)}
      />
      <Tick checked={shown} onChange={setShown}>
        Show the password
      </Tick>
    </div>
  );
}
