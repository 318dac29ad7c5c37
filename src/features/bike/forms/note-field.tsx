import { TextArea } from "../../../ui/text-area.tsx";

interface Props {
  label?: string;
  hint?: string;
  value: string;
  onChange: (text: string) => void;
  error?: string;
}

export function NoteField({ label = "Note", hint = "May be left empty.", ...field }: Props) {
  return (
    <TextArea
      label={label}
      hint={hint}
      error={field.error}
      value={field.value}
      onChange={(event) => field.onChange(event.target.value)}
    />
  );
}
