import { useEffect, useRef, type ReactNode } from "react";

/** What became of a form that was sent. A failure takes the focus, since it asks for something to be done. */
export function FormMessage({ kind, children }: { kind: "fault" | "caution" | "done"; children: ReactNode }) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (kind !== "done") box.current?.focus();
  }, [kind, children]);
  return (
    <div ref={box} className={`${kind} mb-3`} role={kind === "done" ? "status" : "alert"} tabIndex={-1}>
      {children}
    </div>
  );
}
