import { useEffect, useState } from "react";

const MINUTE_MS = 60_000;

/** The time of day, renewed every minute: for "saved 4 min ago" and due dates. */
export function useNow(): number {
  const [now, setNow] = useState(() => Date.now());
  useEffect(() => {
    const timer = setInterval(() => setNow(Date.now()), MINUTE_MS);
    return () => clearInterval(timer);
  }, []);
  return now;
}
