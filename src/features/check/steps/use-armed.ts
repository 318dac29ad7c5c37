import { useEffect, useState } from "react";

/** Longer than a glove's double tap takes. */
const ARMED_AFTER_MS = 600;

/** False for a moment after a button appears where another one was just pressed. */
export function useArmed(): boolean {
  const [armed, setArmed] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setArmed(true), ARMED_AFTER_MS);
    return () => clearTimeout(timer);
  }, []);
  return armed;
}
