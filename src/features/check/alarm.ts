/** Says that time is up to someone who is not looking: a tone, unless muted, and a shake. */
import { isMuted } from "./sound-choice.ts";

const TONE_HZ = 880;
const TONE_SECONDS = 0.35;
const PAUSE_SECONDS = 0.25;

let audio: AudioContext | null = null;

/** Browsers let sound out only after a tap: to be called from one. */
export function unlockSound(): void {
  if (typeof AudioContext === "undefined") return;
  audio ??= new AudioContext();
  void audio.resume().catch(() => undefined);
}

function playTones(count: number): void {
  if (!audio || isMuted()) return;
  for (let index = 0; index < count; index++) {
    const start = audio.currentTime + index * (TONE_SECONDS + PAUSE_SECONDS);
    const tone = audio.createOscillator();
    const volume = audio.createGain();
    tone.frequency.value = TONE_HZ;
    volume.gain.setValueAtTime(0.6, start);
    volume.gain.exponentialRampToValueAtTime(0.001, start + TONE_SECONDS);
    tone.connect(volume).connect(audio.destination);
    tone.start(start);
    tone.stop(start + TONE_SECONDS);
  }
}

/** One signal where the run is over, two where the level can be read. */
export function soundAlarm(count: number): void {
  playTones(count);
  // Not every browser has it, and a phone may refuse.
  navigator.vibrate?.(Array.from({ length: 2 * count - 1 }, () => 250));
}
