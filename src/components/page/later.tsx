import { useEffect, useState, type ComponentType } from "react";

interface Meanwhile {
  /** Said until the code has arrived. */
  waiting?: string;
  className?: string;
}

/**
 * A component whose code is fetched when it is first shown. Unlike React's own `lazy`, one that does not arrive takes
 * nothing else off the page, and can be asked for again.
 */
export function later<P extends object>(
  load: () => Promise<ComponentType<P>>,
  { waiting = "Loading…", className = "panel-waits" }: Meanwhile = {},
): ComponentType<P> {
  return function Later(props: P) {
    const [View, setView] = useState<ComponentType<P> | null>(null);
    const [failed, setFailed] = useState(false);
    const [tries, setTries] = useState(0);
    useEffect(() => {
      let left = false;
      load().then(
        (component) => left || setView(() => component),
        () => left || setFailed(true),
      );
      return () => {
        left = true;
      };
    }, [tries]);
    if (View) return <View {...props} />;
    return (
      <div className={className} role="status">
        {failed ? (
          <p>
            This part of the page could not be loaded; everything else on it stays as it is. Check the connection, then{" "}
            <button
              type="button"
              className="btn-text"
              onClick={() => {
                setFailed(false);
                setTries(tries + 1);
              }}
            >
              try again
            </button>
            .
          </p>
        ) : (
          <p>{waiting}</p>
        )}
      </div>
    );
  };
}
