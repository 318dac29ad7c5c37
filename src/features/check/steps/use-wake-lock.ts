import { useEffect } from "react";

/** Keeps the screen on while this step shows, where the phone allows it. */
export function useWakeLock(): void {
  useEffect(() => {
    let left = false;
    let lock: WakeLockSentinel | null = null;
    const ask = async () => {
      // A phone lets go of it whenever the page is hidden.
      if (document.visibilityState !== "visible" || !("wakeLock" in navigator)) return;
      try {
        lock = await navigator.wakeLock.request("screen");
        if (left) await lock.release();
      } catch {
        // A low battery may forbid it: the timer goes on all the same.
      }
    };
    const onVisible = () => void ask();
    onVisible();
    document.addEventListener("visibilitychange", onVisible);
    return () => {
      left = true;
      document.removeEventListener("visibilitychange", onVisible);
      void lock?.release().catch(() => undefined);
    };
  }, []);
}
