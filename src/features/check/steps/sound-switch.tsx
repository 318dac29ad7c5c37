import { Volume2, VolumeX } from "lucide-react";
import { Button } from "../../../ui/button.tsx";
import { unlockSound } from "../alarm.ts";
import { setMuted, useMuted } from "../sound-choice.ts";

export function SoundSwitch() {
  const muted = useMuted();
  const press = () => {
    unlockSound();
    setMuted(!muted);
  };
  return (
    <Button onClick={press} aria-pressed={!muted} className="self-start">
      {muted ? <VolumeX aria-hidden /> : <Volume2 aria-hidden />}
      {muted ? "Sound is off" : "Sound is on"}
    </Button>
  );
}
