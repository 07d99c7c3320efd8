import { useEffect, useState, type DependencyList } from "react";

/**
 * An imperative object that lives as long as the caller and its dependencies: made after the first
 * paint, disposed with them. Null until it is made. Made in an effect, since strict mode mounts
 * twice and would go on with one that was disposed.
 */
export function useDisposable<T extends { dispose(): void }>(create: () => T, dependencies: DependencyList): T | null {
  const [made, setMade] = useState<T | null>(null);
  useEffect(() => {
    const object = create();
    // eslint-disable-next-line react-hooks/set-state-in-effect -- the object needs what the first paint put on the page
    setMade(object);
    return () => {
      setMade(null);
      object.dispose();
    };
    // eslint-disable-next-line react-hooks/exhaustive-deps -- the caller names what the object depends on
  }, dependencies);
  return made;
}
