import { useState } from "react";

/** Prints the page, or copies the address of what it shows. */
export function PageActions({ csvHref }: { csvHref: string }) {
  const [said, setSaid] = useState("");
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(window.location.href);
      setSaid("Copied");
    } catch {
      setSaid("Copy it from the address bar: this browser does not allow it here.");
    }
  };
  return (
    <p className="no-print flex flex-wrap gap-x-5 text-ink-2">
      <span role="status" className="text-small">
        {said}
      </span>
      <button type="button" className="btn-text needs-js" onClick={() => window.print()}>
        Print
      </button>
      <a href={csvHref}>CSV</a>
      <button type="button" className="btn-text needs-js" onClick={() => void copy()}>
        Copy link
      </button>
    </p>
  );
}
